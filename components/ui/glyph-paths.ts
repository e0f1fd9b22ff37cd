/**
 * The glyphs: one path each on a 16 grid, stroked 1.5 wide. A state is a cloth being woven: a thread, a crossing, a weave, a
 * bound edge. A role is a shape of its own: torn square (bad), two squares (comparison), stitched square (simulated).
 */
export const glyphPaths = {
  reported: 'M8 1V15',
  'under-investigation': 'M8 1V15M1 8H5.8M10.2 8H15',
  'awaiting-sign-off': 'M4 1V3.2M4 6.8V15M8 1V9.2M8 12.8V15M12 1V3.2M12 6.8V15M1 5H6.2M9.8 5H15M1 11H2.2M5.8 11H10.2M13.8 11H15',
  closed: 'M1.75 1.75H14.25V14.25H1.75ZM8 2V14M2 8H5.8M10.2 8H14',
  waits: 'M3 1.75H13L8 8L13 14.25H3L8 8Z',
  danger: 'M8 2L15 14H1ZM8 6.5V10M8 11.3V12.7',
  verified: 'M1.75 1.75H14.25V14.25H1.75ZM4.5 8.2L7 10.7L11.7 5.3',
  bad: 'M6 1.75H1.75V14.25H6.5M10 1.75H14.25V14.25H10.5M8.5 .5L6.5 4.5L9.5 8L6.5 11.5L8.5 15.5',
  comparison: 'M1.75 1.75H10.25V10.25H1.75ZM5.75 12.5V14.25H14.25V5.75H12.5',
  simulated: 'M1.75 4.5V1.75H4.5M7 1.75H9M11.5 1.75H14.25V4.5M14.25 7V9M14.25 11.5V14.25H11.5M9 14.25H7M4.5 14.25H1.75V11.5M1.75 9V7',
  corrected: 'M1.75 1.75H14.25V14.25H1.75ZM4.5 8H11.5',
  yes: 'M3.5 3.5H12.5V12.5H3.5ZM4 6H12M4 8H12M4 10H12',
  no: 'M3.5 3.5H12.5V12.5H3.5Z',
  untested: 'M6 8H10',
  down: 'M4 6L8 10L12 6',
  up: 'M4 10L8 6L12 10',
  right: 'M6 4L10 8L6 12',
  left: 'M10 4L6 8L10 12',
  undo: 'M2 6H10.5A3.5 3.5 0 0 1 10.5 13H6M5 3L2 6L5 9',
  redo: 'M14 6H5.5A3.5 3.5 0 0 0 5.5 13H10M11 3L14 6L11 9',
  plus: 'M8 2V14M2 8H14',
  save: 'M8 1.5V10M4.5 6.5L8 10L11.5 6.5M2 14H14',
  search: 'M2 2V10H10V2ZM10 10L14.5 14.5',
  more: 'M2 8H4M7 8H9M12 8H14',
  shut: 'M3 3L13 13M13 3L3 13',
  mark: 'M3 13L12 4M12 9V4H7',
  note: 'M2 3H14M2 7H14M2 11H9',
  image: 'M1.75 1.75H14.25V14.25H1.75ZM2 11L6 7L9.5 10.5L11.5 8.5L14 11',
  step: 'M8 1V5M8 11V15M5 5H11V11H5Z',
  tick: 'M3 8.5L6.5 12L13 4',
} as const;

export type GlyphName = keyof typeof glyphPaths;
