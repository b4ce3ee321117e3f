/** What a designer must weigh beside the numbers. */

export const STANDING_LINE =
  "Plinth computes; it approves nothing. Check every design against the codes that apply where it stands, and leave its release to a licensed engineer.";

export const CAUTIONS = [
  "One mass moves along one axis on a linear mount whose base is not moved by the item. Rocking, several axes, flexible floors and stops need more than these relations.",
  "Below √2 times the natural frequency every mount passes on more than it receives. Start-up and run-down cross resonance.",
  "Damping and stiffness of real mounts spread, and change with temperature, load, amplitude and age. Use TRANSBOUND and RELBOUND with their tolerances.",
  "Rubber is stiffer in motion than at rest: use its dynamic stiffness, and its stiffness ratio where a deflection at rest is given.",
  "Leave room for the dynamic deflection, the static sag and shocks together. A mount that strikes its stop no longer isolates.",
  "Restraint against earthquake, transport and loss of a mount is a matter of local codes and is not covered here.",
];
