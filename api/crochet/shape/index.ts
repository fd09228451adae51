/** The small door of the library: geometry and yarn, without the language. Lengths are in millimetres. */
export { silhouetteOf, type Profile, type Sample } from './silhouette.ts';
export { flatnessOf, type Flatness } from './flatness.ts';
export { yarnFor, type YarnSample, type YarnUse } from './yarn.ts';
