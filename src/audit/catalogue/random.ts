import { relation } from "./relation";

const flat = "white noise through one degree of freedom: ∫|H|² df = π/2·fn·Q";

export const random = [
  relation({
    quantity: "random-response-rms",
    out: "grms",
    formula: "SQRT(PI()/2*fn*Q*S)",
    says: "Rms acceleration of the item on a flat spectrum, short form",
    source: flat,
    cellFunction: "MILES",
    arguments: ["fn", "zeta", "S"],
    approximate: true,
    slips: [
      { mistake: "half-pi-missing", formula: "SQRT(fn*Q*S)", why: "π/2 is missing: the result is 20 % too low." },
      { mistake: "half-pi-missing", formula: "SQRT(PI()*fn*Q*S)", why: "The factor is π/2." },
      { mistake: "half-pi-missing", formula: "SQRT(2*PI()*fn*Q*S)", why: "The factor is π/2." },
      { mistake: "half-pi-missing", formula: "SQRT(2/PI()*fn*Q*S)", why: "The factor is π/2, not 2/π." },
      {
        mistake: "square-root-missing",
        formula: "PI()/2*fn*Q*S",
        why: "The square root is left out: this is the mean square.",
      },
      { mistake: "ratio-inverted", formula: "SQRT(PI()/2*fn/Q*S)", why: "Q multiplies." },
      { mistake: "sign-precedence", formula: "SQRT(PI()/2)*fn*Q*S", why: "The square root covers π/2 only." },
      { mistake: "ratio-inverted", formula: "SQRT(PI()/2*Q*S/fn)", why: "fn multiplies." },
    ],
    systematic: false,
  }),
  relation({
    quantity: "random-response-rms",
    out: "grms",
    formula: "SQRT(PI()/2*fn*(1+4*zeta^2)/(2*zeta)*S)",
    says: "Rms acceleration of the item on a flat spectrum, exact",
    source: flat,
    cellFunction: "MILES",
    arguments: ["fn", "zeta", "S"],
    slips: [
      { mistake: "half-pi-missing", formula: "SQRT(fn*(1+4*zeta^2)/(2*zeta)*S)", why: "π/2 is missing." },
      {
        mistake: "damping-not-squared",
        formula: "SQRT(PI()/2*fn*(1+4*zeta)/(2*zeta)*S)",
        why: "ζ must be squared in the numerator.",
      },
      { mistake: "loss-factor-as-damping-ratio", formula: "SQRT(PI()/2*fn*(1+4*zeta^2)/zeta*S)", why: "Q is 1/(2ζ)." },
    ],
    systematic: false,
  }),
  relation({
    quantity: "random-response-rms",
    out: "zrms",
    formula: "grms/(2*PI()*fn)^2",
    says: "Rms stretch of the mount under random motion",
    source: "the response is at fn: z = a/(2πfn)²",
    approximate: true,
    slips: [
      {
        mistake: "sign-precedence",
        formula: "grms/(2*PI()*fn^2)",
        why: "Without brackets only the frequency is squared, not 2π.",
      },
      { mistake: "ratio-not-squared", formula: "grms/(2*PI()*fn)", why: "The angular frequency must be squared." },
      { mistake: "angular-cyclic-mixup", formula: "grms/fn^2", why: "Without (2π)² the frequency is taken as rad/s." },
    ],
    systematic: false,
  }),
  relation({
    quantity: "random-response-rms",
    out: "zrms",
    formula: "SQRT(PI()/2*fn*Q*S)/(2*PI()*fn)^2",
    says: "Rms stretch of the mount on a flat spectrum",
    source: flat,
    systematic: false,
  }),
  relation({
    quantity: "random-response-rms",
    out: "zrms",
    formula: "SQRT(S/(8*zeta*(2*PI()*fn)^3))",
    says: "Rms stretch of the mount on a flat spectrum, from the damping ratio",
    source: flat,
    slips: [
      {
        mistake: "angular-cyclic-mixup",
        formula: "SQRT(S/(8*zeta*fn^3))",
        why: "Without 2π the frequency is taken as rad/s.",
      },
    ],
  }),
  relation({
    quantity: "random-response-rms",
    out: "S",
    formula: "2*grms^2/(PI()*fn*Q)",
    says: "Spectral density that gives an rms response",
    source: flat,
    systematic: false,
  }),
  relation({
    quantity: "helper",
    out: "Sout",
    formula: "T^2*S",
    says: "Spectral density of the response",
    source: "G_x = |H|²·G_u",
    slips: [
      { mistake: "ratio-not-squared", formula: "T*S", why: "A spectral density is multiplied by T², not by T." },
      { mistake: "ratio-inverted", formula: "S/T^2", why: "A spectral density is multiplied by T²." },
      { mistake: "square-root-missing", formula: "SQRT(T)*S", why: "A spectral density is multiplied by T²." },
      { mistake: "ratio-not-squared", formula: "T*S^2", why: "T is squared, not the density." },
    ],
    systematic: false,
  }),
];
