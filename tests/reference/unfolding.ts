/**
 * Outside values for unfolding, made with numpy apart from this project: g_p = √([(SᴴS)⁻¹]_pp·(SᴴS)_pp), Pruessmann et al., Magn Reson Med
 * 1999;42:952. It is the same for both places.
 */
export const unfoldingReference = {
  /** S by element, each [re, im] by place: two elements that overlap, three with phase, two that each see one place. */
  sensitivities: {
    overlapping: [
      [
        [1, 0],
        [0.5, 0],
      ],
      [
        [0.5, 0],
        [1, 0],
      ],
    ],
    threeWithPhase: [
      [
        [1, 0],
        [0, 0.3],
      ],
      [
        [0.4, 0],
        [1, 0],
      ],
      [
        [0.2, 0],
        [0.6, 0],
      ],
    ],
    apart: [
      [
        [1, 0],
        [0, 0],
      ],
      [
        [0, 0],
        [1, 0],
      ],
    ],
  },
  geometryFactor: { overlapping: 1.666666667, threeWithPhase: 1.123047257, apart: 1 },
} as const;
