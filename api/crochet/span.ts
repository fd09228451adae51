/** A stretch of a text, in UTF-16 units: `text.slice(start, end)` is the stretch itself. */
export interface Span {
  readonly start: number;
  readonly end: number;
}

/** The two vocabularies of the trade. Inside the library everything is US; UK is a way of reading and of printing. */
export type Terms = 'US' | 'UK';
