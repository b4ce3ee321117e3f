import { relation } from "./relation";

const term = "term of the transmissibility";

/** Intermediate terms that sheets keep in columns of their own. */
export const helpers = [
  relation({ quantity: "helper", out: "rr", formula: "r^2", says: "Square of the frequency ratio", source: term }),
  relation({ quantity: "helper", out: "detuning", formula: "1-r^2", says: "Detuning", source: term }),
  relation({
    quantity: "helper",
    out: "detuning2",
    formula: "(1-r^2)^2",
    says: "Square of the detuning",
    source: term,
  }),
  ...(
    [
      ["detuning", "1-rr", "Detuning from the square of the frequency ratio"],
      ["detuning2", "(1-rr)^2", "Square of the detuning from the square of the frequency ratio"],
      ["detuning2", "detuning^2", "Square of the detuning from the detuning"],
      ["numerator", "1+bb", "Numerator of T² from the square of the damping term"],
      ["denominator", "detuning2+bb", "Denominator of T² from its terms"],
      ["rootNumerator", "SQRT(numerator)", "Numerator of T from its square"],
      ["rootDenominator", "SQRT(denominator)", "Denominator of T from its square"],
    ] as const
  ).map(([out, formula, says]) =>
    relation({ quantity: "helper", out, formula, says, source: term, systematic: false, between: true }),
  ),
  relation({
    quantity: "helper",
    out: "bb",
    formula: "b^2",
    says: "Square of the damping term from the damping term",
    source: term,
    between: true,
  }),
  relation({
    quantity: "absolute-transmissibility",
    out: "T",
    formula: "SQRT(numerator/denominator)",
    says: "Absolute transmissibility from its terms",
    source: "definition of the terms",
    between: true,
  }),
  relation({
    quantity: "absolute-transmissibility",
    out: "T",
    formula: "rootNumerator/rootDenominator",
    says: "Absolute transmissibility from the roots of its terms",
    source: "definition of the terms",
    between: true,
    systematic: false,
  }),
  relation({
    quantity: "relative-transmissibility",
    out: "R",
    formula: "rr/rootDenominator",
    says: "Relative transmissibility from its terms",
    source: "definition of the terms",
    between: true,
    systematic: false,
  }),
  relation({
    quantity: "helper",
    out: "b",
    formula: "2*zeta*r",
    says: "Damping term",
    source: term,
    systematic: false,
    slips: [
      { mistake: "ratio-inverted", formula: "2*zeta/r", why: "The damping term is 2ζr." },
      { mistake: "loss-factor-as-damping-ratio", formula: "zeta*r", why: "The damping term is 2ζr." },
      { mistake: "sign-precedence", formula: "2*zeta*r^2", why: "The damping term is 2ζr." },
    ],
  }),
  relation({
    quantity: "helper",
    out: "bb",
    formula: "(2*zeta*r)^2",
    says: "Square of the damping term",
    source: term,
    slips: [{ mistake: "damping-not-squared", formula: "4*zeta*r^2", why: "(2ζr)² is 4ζ²r²." }],
  }),
  relation({
    quantity: "helper",
    out: "bb",
    formula: "eta^2",
    says: "Square of the loss factor",
    source: "hysteretic damping",
    systematic: false,
    slips: [{ mistake: "damping-not-squared", formula: "eta", why: "η must be squared." }],
  }),
  relation({ quantity: "helper", out: "numerator", formula: "1+(2*zeta*r)^2", says: "Numerator of T²", source: term }),
  relation({
    quantity: "helper",
    out: "denominator",
    formula: "(1-r^2)^2+(2*zeta*r)^2",
    says: "Denominator of T²",
    source: term,
  }),
  relation({
    quantity: "helper",
    out: "rootNumerator",
    formula: "SQRT(1+(2*zeta*r)^2)",
    says: "Numerator of T",
    source: term,
  }),
  relation({
    quantity: "helper",
    out: "rootDenominator",
    formula: "SQRT((1-r^2)^2+(2*zeta*r)^2)",
    says: "Denominator of T",
    source: term,
  }),
  relation({
    quantity: "helper",
    out: "quasi",
    formula: "1/SQRT((1-r^2)^2+(2*zeta*r)^2)",
    says: "Magnification of a driven mass",
    source: term,
    systematic: false,
  }),
];
