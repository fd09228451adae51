import QRCode from 'qrcode';
import type { Pen } from './pen.ts';

/** 16 mm in points: the side of the code without its white edge. */
export const QR_SIDE = (16 / 25.4) * 72;
const CLEAR_MODULES = 4;

export interface QrPlan {
  /** The side with four clear modules on each edge, in points. */
  readonly side: number;
  readonly draw: (x: number, y: number) => void;
}

/** A code for an address: black on a white field that keeps four clear modules all round. */
export function planQr(pen: Pen, address: string): QrPlan {
  const { modules } = QRCode.create(address, { errorCorrectionLevel: 'M' });
  const step = QR_SIDE / modules.size;
  const side = QR_SIDE + 2 * CLEAR_MODULES * step;
  return {
    side,
    draw: (x, y) => {
      const { doc } = pen;
      doc.rect(x, y, side, side).fill('#FFFFFF');
      for (let row = 0; row < modules.size; row++) {
        for (let column = 0; column < modules.size; column++) {
          if (!modules.get(row, column)) continue;
          let wide = 1;
          while (column + wide < modules.size && modules.get(row, column + wide)) wide++;
          doc.rect(x + (CLEAR_MODULES + column) * step, y + (CLEAR_MODULES + row) * step, wide * step, step);
          column += wide - 1;
        }
      }
      doc.fill('#000000');
    },
  };
}
