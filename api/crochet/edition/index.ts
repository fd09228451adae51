export { blocksOf, type Block } from './blocks.ts';
export { buildEdition, ENGINE_VERSION } from './build-edition.ts';
export { differenceOf, type Difference } from './difference.ts';
export type * from './document.ts';
export { lineLabel, roundsOf } from './line-label.ts';
export { projectEdition, type PublicEdition, type PublicLine, type PublicPiece } from './project-edition.ts';
export type { EditionSource, SourceLine, SourcePiece } from './source.ts';
