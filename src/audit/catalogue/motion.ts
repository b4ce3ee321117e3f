import type { Role } from "../roles";
import { relation, type Relation } from "./relation";

const sine = "derivatives of a sine: v = 2πf·x, a = (2πf)²·x";

/** Displacement, velocity and acceleration of one place. */
function rates(x: Role, v: Role, a: Role, where: string): Relation[] {
  const quantity = "motion-conversion" as const;
  const precedence = {
    mistake: "sign-precedence",
    why: "Without brackets only the frequency is squared, not 2π.",
  } as const;
  const root = { mistake: "ratio-not-squared", why: "The angular frequency must be squared." } as const;
  return [
    relation({
      quantity,
      out: v,
      formula: `2*PI()*f*${x}`,
      says: `Velocity of the ${where} from its displacement`,
      source: sine,
      slips: [{ mistake: "ratio-inverted", formula: `${x}/(2*PI()*f)`, why: "Velocity is displacement times 2πf." }],
    }),
    relation({
      quantity,
      out: a,
      formula: `(2*PI()*f)^2*${x}`,
      says: `Acceleration of the ${where} from its displacement`,
      source: sine,
      slips: [
        { ...precedence, formula: `2*PI()*f^2*${x}` },
        { ...root, formula: `2*PI()*f*${x}` },
      ],
    }),
    relation({
      quantity,
      out: a,
      formula: `2*PI()*f*${v}`,
      says: `Acceleration of the ${where} from its velocity`,
      source: sine,
      slips: [
        {
          mistake: "ratio-not-squared",
          formula: `(2*PI()*f)^2*${v}`,
          why: "One factor 2πf leads from velocity to acceleration.",
        },
      ],
    }),
    relation({
      quantity,
      out: x,
      formula: `${v}/(2*PI()*f)`,
      says: `Displacement of the ${where} from its velocity`,
      source: sine,
      slips: [
        { mistake: "ratio-inverted", formula: `${v}*2*PI()*f`, why: "Displacement is velocity over 2πf." },
        {
          mistake: "ratio-not-squared",
          formula: `${v}/(2*PI()*f)^2`,
          why: "One factor 2πf leads from displacement to velocity.",
        },
      ],
    }),
    relation({
      quantity,
      out: x,
      formula: `${a}/(2*PI()*f)^2`,
      says: `Displacement of the ${where} from its acceleration`,
      source: sine,
      slips: [
        { ...precedence, formula: `${a}/(2*PI()*f^2)` },
        { ...root, formula: `${a}/(2*PI()*f)` },
      ],
    }),
    relation({
      quantity,
      out: v,
      formula: `${a}/(2*PI()*f)`,
      says: `Velocity of the ${where} from its acceleration`,
      source: sine,
      slips: [
        { mistake: "ratio-inverted", formula: `${a}*2*PI()*f`, why: "Velocity is acceleration over 2πf." },
        {
          mistake: "ratio-not-squared",
          formula: `${a}/(2*PI()*f)^2`,
          why: "One factor 2πf leads from velocity to acceleration.",
        },
      ],
    }),
  ];
}

const places: readonly [Role, Role, Role][] = [
  ["U", "X", "Z"],
  ["Uv", "Xv", "Zv"],
  ["Ua", "Xa", "Za"],
];

const ratios = places.flatMap(([base, item, stretch]) => [
  relation({
    quantity: "payload-motion",
    out: item,
    formula: `T*${base}`,
    says: "Motion of the item from the motion of its base",
    source: "T = X/U, definition",
    slips: [
      { mistake: "ratio-inverted", formula: `${base}/T`, why: "The item moves T times as much as the base." },
      {
        mistake: "efficiency-not-of-motion",
        formula: `(1-T)*${base}`,
        why: "1 − T of the base motion is what is kept away, not what remains.",
      },
      {
        mistake: "ratio-not-squared",
        formula: `T^2*${base}`,
        why: "T², as for spectral densities, does not belong to an amplitude.",
      },
    ],
    systematic: false,
  }),
  relation({
    quantity: "relative-displacement",
    out: stretch,
    formula: `R*${base}`,
    says: "Stretch of the mount from the motion of the base",
    source: "R = Z/U, definition",
    slips: [{ mistake: "ratio-inverted", formula: `${base}/R`, why: "The stretch is R times the base motion." }],
    systematic: false,
  }),
  relation({
    quantity: "absolute-transmissibility",
    out: "T",
    formula: `${item}/${base}`,
    says: "Transmissibility as a quotient of two motions",
    source: "definition",
    slips: [{ mistake: "ratio-inverted", formula: `${base}/${item}`, why: "Transmissibility is item over base." }],
    systematic: false,
  }),
  relation({
    quantity: "relative-transmissibility",
    out: "R",
    formula: `${stretch}/${base}`,
    says: "Relative transmissibility as a quotient of two motions",
    source: "definition",
    slips: [
      {
        mistake: "ratio-inverted",
        formula: `${base}/${stretch}`,
        why: "Relative transmissibility is stretch over base motion.",
      },
    ],
    systematic: false,
  }),
  relation({
    quantity: "payload-motion",
    out: base,
    formula: `${item}/T`,
    says: "Motion of the base from the motion of the item",
    source: "T = X/U, definition",
    systematic: false,
  }),
]);

/** Forces of all mounts together, and the same of one mount. */
function forces(share: "" | "Each"): Relation[] {
  const quantity = "mount-force" as const;
  const [F, Fs, Fd, k, c, m] = [
    `F${share}`,
    `Fs${share}`,
    `Fd${share}`,
    `k${share}`,
    `c${share}`,
    `m${share}`,
  ] as Role[];
  const where = share === "" ? "" : ", one mount";
  return [
    relation({
      quantity,
      out: F!,
      formula: `${m}*Xa`,
      says: `Force through the mounts from the acceleration of the item${where}`,
      source: "Newton",
      systematic: false,
    }),
    relation({
      quantity,
      out: F!,
      formula: `${m}*grms`,
      says: `Force through the mounts under random motion${where}`,
      source: "Newton",
      systematic: false,
    }),
    relation({
      quantity,
      out: F!,
      formula: `Z*SQRT(${k}^2+(2*PI()*f*${c})^2)`,
      says: `Force through spring and damper together from the stretch${where}`,
      source: "F = (k + i2πf·c)·Z",
      slips: [
        { mistake: "undamped-form", formula: `Z*${k}`, why: "The damper's part is left out." },
        {
          mistake: "square-root-missing",
          formula: `Z*(${k}+2*PI()*f*${c})`,
          why: "Spring and damper force are a quarter period apart: add their squares.",
        },
        { mistake: "angular-cyclic-mixup", formula: `Z*SQRT(${k}^2+(f*${c})^2)`, why: "The damper needs 2πf." },
        {
          mistake: "damping-not-squared",
          formula: `Z*SQRT(${k}^2+2*PI()*f*${c})`,
          why: "The damper's part must be squared.",
        },
      ],
    }),
    relation({
      quantity,
      out: F!,
      formula: `Z*${k}*SQRT(1+(2*zeta*r)^2)`,
      says: `Force through spring and damper together from stretch and damping ratio${where}`,
      source: "c·2πf = k·2ζr",
      slips: [
        { mistake: "undamped-form", formula: `Z*${k}`, why: "The damper's part is left out." },
        {
          mistake: "square-root-missing",
          formula: `Z*${k}*(1+2*zeta*r)`,
          why: "Spring and damper force are a quarter period apart.",
        },
        { mistake: "damping-not-squared", formula: `Z*${k}*SQRT(1+2*zeta*r)`, why: "2ζr must be squared." },
      ],
      systematic: false,
    }),
    relation({
      quantity,
      out: F!,
      formula: `Z*${k}*SQRT(1+eta^2)`,
      says: `Force through a hysteretic mount from its stretch${where}`,
      source: "F = k(1 + iη)·Z",
      slips: [
        { mistake: "damping-not-squared", formula: `Z*${k}*SQRT(1+eta)`, why: "η must be squared." },
        { mistake: "undamped-form", formula: `Z*${k}`, why: "The damping's part is left out." },
      ],
      systematic: false,
    }),
    relation({
      quantity,
      out: Fs!,
      formula: `Z*${k}`,
      says: `Force in the spring from the stretch${where}`,
      source: "Hooke",
      slips: [{ mistake: "ratio-inverted", formula: `Z/${k}`, why: "Force is stiffness times stretch." }],
      systematic: false,
    }),
    relation({
      quantity,
      out: Fs!,
      formula: `zrms*${k}`,
      says: `Rms force in the spring from the rms stretch${where}`,
      source: "Hooke",
      systematic: false,
    }),
    relation({
      quantity,
      out: Fd!,
      formula: `2*PI()*f*${c}*Z`,
      says: `Force in the damper from the stretch${where}`,
      source: "F = c·v",
      slips: [
        {
          mistake: "ratio-not-squared",
          formula: `(2*PI()*f)^2*${c}*Z`,
          why: "The damper feels the velocity: one factor 2πf.",
        },
      ],
    }),
    relation({
      quantity,
      out: Fd!,
      formula: `${c}*Zv`,
      says: `Force in the damper from the relative velocity${where}`,
      source: "F = c·v",
      systematic: false,
    }),
    relation({
      quantity,
      out: F!,
      formula: `SQRT(${Fs}^2+${Fd}^2)`,
      says: `Force of spring and damper together${where}`,
      source: "a quarter period apart",
      slips: [
        {
          mistake: "square-root-missing",
          formula: `${Fs}+${Fd}`,
          why: "Spring and damper force are a quarter period apart: add their squares.",
        },
      ],
    }),
  ];
}

/** Shares of one mount in the forces. */
const forceShares = (["F", "Fs", "Fd"] as const).map((all) =>
  relation({
    quantity: "mount-force",
    out: `${all}Each`,
    formula: `${all}/n`,
    says: "Force of one mount",
    source: "equal shares",
    slips: [
      { mistake: "total-for-per-mount", formula: all, why: "The whole force stands where one mount's share belongs." },
    ],
    systematic: false,
  }),
);

export const motion = [
  ...rates("U", "Uv", "Ua", "base"),
  ...rates("X", "Xv", "Xa", "item"),
  ...rates("Z", "Zv", "Za", "stretch"),
  ...ratios,
  relation({
    quantity: "relative-displacement",
    out: "Z",
    formula: "ABS(X-U)",
    says: "Difference of two amplitudes: the stretch only where the motions are in phase or opposed",
    source: "geometry",
    undamped: true,
    systematic: false,
  }),
  ...forces(""),
  ...forces("Each"),
  ...forceShares,
  relation({
    quantity: "motion-conversion",
    out: "aMax",
    formula: "2*PI()*fn*SQRT(2*g*height)",
    says: "Peak acceleration of a drop on a linear cushion",
    source: "m·v²/2 = k·x²/2 with v² = 2gh",
  }),
  relation({
    quantity: "required-natural-frequency",
    out: "fn",
    formula: "aMax/(2*PI()*SQRT(2*g*height))",
    says: "Natural frequency of a linear cushion that holds a drop to an acceleration",
    source: "a = ω_n·v with v² = 2gh",
    required: true,
  }),
];
