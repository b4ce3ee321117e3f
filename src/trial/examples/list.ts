/** The example workbooks, in the order of the menu. */
export const examples = [
  {
    file: "balance-sizing.xlsx",
    label: "Sizing sheet",
    says: "Mounts for a microbalance in a seed bank, sized with Plinth functions",
  },
  {
    file: "condenser-sweep.xlsx",
    label: "Sweep with a chart",
    says: "The cold store's rooftop condenser: one spilled sweep, three dampings",
  },
  {
    file: "seedbank-legacy.xlsx",
    label: "Legacy sheet",
    says: "Hand formulas inherited from an earlier project, some of them mistaken",
  },
];
