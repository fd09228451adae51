import type { PublicEdition } from '#contract/editions';

/** Where an edition's sheet is, in the terms the viewer reads. */
export function sheetHref({ code, edition, terms: own }: PublicEdition, terms: 'US' | 'UK'): string {
  const sheet = `/api/editions/${code}/${edition ?? 1}/sheet.pdf`;
  return terms === own ? sheet : `${sheet}?terms=${terms}`;
}
