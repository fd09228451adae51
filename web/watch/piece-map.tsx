export function PieceMap() {
  return null;
}
