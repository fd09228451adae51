import { DetailsForm } from './details-form.tsx';
import { MaterialsLedger } from './materials-ledger.tsx';
import type { SheetDesk } from './sheet-desk.ts';
import { CautionsLedger, NotesLedger, StitchesLedger } from './words-ledger.tsx';

/** Everything of a sheet that is not a line: words, materials, stitches, notes and cautions, as one ledger. */
export function SheetForms({ desk }: { desk: SheetDesk }) {
  return (
    <>
      <DetailsForm desk={desk} />
      <MaterialsLedger desk={desk} />
      <StitchesLedger desk={desk} />
      <NotesLedger desk={desk} />
      <CautionsLedger desk={desk} />
    </>
  );
}
