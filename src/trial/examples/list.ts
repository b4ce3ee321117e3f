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
  {
    file: "van-random.xlsx",
    label: "Random motion",
    says: "A seed scanner in a van: density profile, response, three sigma against a gap",
  },
  {
    file: "trolley-shock.xlsx",
    label: "Shock record",
    says: "A cabinet on a trolley that rolls off a kerb: record, response, spectrum",
  },
  {
    file: "freezer-mounts.xlsx",
    label: "Four mounts",
    says: "An off-centre compressor: load on each mount and six natural frequencies",
  },
];
