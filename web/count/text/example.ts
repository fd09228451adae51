/** A small piece with the slips that people make, to try the count on. */
export const EXAMPLE = `Harvest mouse

Body (make 1)
R1: 6 sc in magic ring (6)
R2: inc x 6 (12)
R3: (sc, inc) x 6 (18)
R4: (2 sc, inc) x 6 (24)
R5-8: sc in each st around (24)
R9: (2 sc, dec) x 6
R10: sc in each st around (18)
R11: (2 sc, inc) x 6 (22)
R12-13: sc in each st around (24)
R14: (3 sc, dec) x 6 (18)
R15: sc in each st around (18)
Stuff the body.
R16: (sc, dec) x 6 (12)
R17: dec x 6 (6)
Fasten off and close the hole.

Tail
Row 1: ch 14, sc in 2nd ch from hook and in each ch across (13)
Row 2: ch 1, turn, sc in each st across (13)
`;
