/** What a formula can be found to compute. Ids are permanent. */
export const quantities = {
  "frequency-conversion": "Conversion between frequency units, or from a speed to the frequency that it causes",
  "natural-frequency": "Natural frequency of the mass on its mounts",
  "frequency-ratio": "Excitation frequency divided by natural frequency",
  "damping-ratio": "Damping as a fraction of critical, or a quantity that states the same",
  "damping-coefficient": "Damping coefficient of the mounts",
  "critical-damping": "Damping coefficient at which the mass just does not oscillate",
  "static-deflection": "Deflection of the mounts under the weight",
  "required-static-deflection": "Least static deflection for a wanted isolation",
  "required-natural-frequency": "Greatest natural frequency for a wanted isolation",
  "required-stiffness": "Stiffness that gives a wanted natural frequency",
  "mount-stiffness": "Stiffness of the mounts, one or together",
  "mount-load": "Load that one mount carries",
  "absolute-transmissibility": "Motion of the item divided by motion of its base",
  "relative-transmissibility": "Stretch of the mount divided by motion of the base",
  "isolation-efficiency": "Part of the base motion that does not reach the item",
  "transmissibility-db": "Transmissibility as a level in decibels",
  "absolute-phase": "Angle by which the item lags behind its base",
  "relative-phase": "Angle by which the stretch of the mount lags behind the base",
  "peak-transmissibility": "Largest transmissibility over frequency, exact or as a customary approximation",
  "motion-conversion":
    "Conversion between displacement, velocity and acceleration, or between peak, rms and peak-to-peak",
  "payload-motion": "Motion of the item",
  "relative-displacement": "Motion of the item relative to its base",
  "mount-force": "Dynamic force through the mounts",
  "overall-rms": "Overall rms value over a band or a set of lines",
  "random-response-rms": "Response to random base motion, as rms or a multiple of it",
  helper: "An intermediate term",
} as const;

export type Quantity = keyof typeof quantities;

/** What can be wrong with a formula. Ids are permanent. */
export const mistakes = {
  "undamped-form": "damping is left out although the sheet has it",
  "numerator-damping-missing":
    "the damping term (2ζr)² is missing in the numerator: that is a driven mass, not a moving base",
  "damping-not-squared": "the damping term is not squared",
  "ratio-not-squared": "the frequency ratio is not squared",
  "square-root-missing": "the square root is missing",
  "ratio-inverted": "a ratio is upside down",
  "absolute-value-missing": "the absolute value is missing, so the sign is wrong on one side of resonance",
  "absolute-used-for-relative": "the absolute motion stands where the relative motion belongs",
  "relative-used-for-absolute": "the relative motion stands where the absolute motion belongs",
  "angular-cyclic-mixup": "rad/s and Hz are mixed up: a factor 2π too many or too few",
  "speed-unit": "revolutions per minute and Hz are mixed up: a factor 60 too many or too few",
  "length-unit": "a unit of length is mixed up",
  "mass-weight-mixup": "weight and mass are mixed up: g is missing or doubled",
  "percent-as-ratio": "a percentage is used as a fraction, or a fraction as a percentage",
  "loss-factor-as-damping-ratio": "the loss factor is used as the damping ratio; ζ = η/2",
  "amplitude-kind": "peak, rms and peak-to-peak are confused",
  "decibel-factor": "the factor of the level is wrong: 20 log10 of an amplitude ratio, 10 log10 of a power ratio",
  "constant-wrong": "a constant is mistyped",
  "sign-precedence": "a sign or a bracket makes the spreadsheet compute something else than is meant",
  "mount-count-missing": "the number of mounts is left out",
  "total-for-per-mount": "the total stands where the value per mount belongs, or the reverse",
  "half-pi-missing": "the factor π/2 of the flat-spectrum formula is missing",
  "fill-break": "the formula departs from the rest of its column",
  "value-typed-over": "a number is typed over the formula",
  "reference-slip": "a reference points to the wrong cell",
  "static-stiffness-for-dynamic": "the static stiffness stands where the dynamic stiffness belongs",
  "efficiency-not-of-motion": "what is reported is not 1 − T of the motion",
} as const;

export type Mistake = keyof typeof mistakes;
