/** Rounds one and two of any piece begun in a ring, the seam at twelve o'clock and a marker hung in it. */
const LARGE = {
  box: '5 3 54 56',
  rings:
    'M27.60 21.38A11.5 11.5 0 0 0 21.30 27.79M20.63 30.29A11.5 11.5 0 0 0 22.14 37.93M23.72 39.99A11.5 11.5 0 0 0 30.70 43.43M33.30 43.43A11.5 11.5 0 0 0 40.28 39.99M41.86 37.93A11.5 11.5 0 0 0 43.37 30.29M42.70 27.79A11.5 11.5 0 0 0 36.40 21.38M25.40 10.49A22.5 22.5 0 0 0 17.27 14.99M15.40 16.81A22.5 22.5 0 0 0 11.13 23.59M10.30 26.06A22.5 22.5 0 0 0 9.59 34.05M9.98 36.62A22.5 22.5 0 0 0 13.00 44.05M14.51 46.16A22.5 22.5 0 0 0 20.59 51.39M22.90 52.58A22.5 22.5 0 0 0 30.70 54.46M33.30 54.46A22.5 22.5 0 0 0 41.10 52.58M43.41 51.39A22.5 22.5 0 0 0 49.49 46.16M51.00 44.05A22.5 22.5 0 0 0 54.02 36.62M54.41 34.05A22.5 22.5 0 0 0 53.70 26.06M52.87 23.59A22.5 22.5 0 0 0 48.60 16.81M46.73 14.99A22.5 22.5 0 0 0 38.60 10.49',
  ringWidth: 4.6,
  marker: 'M30.6 25V8.6a4.2 4.2 0 1 1 4.2 4.2',
  markerWidth: 3,
};
const SMALL = {
  box: '8 6 48 50',
  rings:
    'M25.00 13.27A20 20 0 0 0 13.66 24.02M12.26 28.81A20 20 0 0 0 14.62 41.90M17.61 45.89A20 20 0 0 0 29.51 51.84M34.49 51.84A20 20 0 0 0 46.39 45.89M49.38 41.90A20 20 0 0 0 51.74 28.81M50.34 24.02A20 20 0 0 0 39.00 13.27',
  ringWidth: 7,
  marker: 'M32 27V12a6 6 0 1 1 6 6',
  markerWidth: 5,
};

/** The house's mark. On cloth it takes the stitch colour; on paper woad, with a weld marker. */
export function Mark({ size = 34, ground = 'paper' }: { size?: number; ground?: 'paper' | 'cloth' }) {
  const shape = size < 24 ? SMALL : LARGE;
  const onCloth = ground === 'cloth';
  return (
    <svg width={size} height={size} viewBox={shape.box} fill="none" aria-hidden>
      <path
        d={shape.rings}
        stroke={onCloth ? 'var(--color-stitch)' : 'var(--color-woad)'}
        strokeWidth={shape.ringWidth}
      />
      <path
        d={shape.marker}
        stroke={onCloth ? 'var(--color-weldfill)' : 'var(--color-weld)'}
        strokeWidth={shape.markerWidth}
        strokeLinecap="round"
      />
    </svg>
  );
}
