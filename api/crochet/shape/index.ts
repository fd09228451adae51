/** The small door of the library: geometry and yarn, without the language. Lengths of work are in millimetres, of drawings in px. */
export { silhouetteOf, type Profile, type Sample } from './silhouette.ts';
export { flatnessOf, type Flatness } from './flatness.ts';
export { yarnFor, type YarnSample, type YarnUse } from './yarn.ts';
export { ringMap } from './ring-map.ts';
export { type Ring, type RingLine, type RingMapGeometry, type RingOptions, type RingState } from './ring-types.ts';
export { staffOf, type StaffGeometry, type StaffRow } from './staff.ts';
