/**
 * Signs that a triangulation hangs on, without rounding. Coordinates are whole numbers (tenths of a millimetre): a
 * float answers where it is beyond doubt, and whole-number arithmetic of any length where it is not.
 */
export type Whole = readonly [x: number, y: number];

const big = (value: number): bigint => BigInt(value);

/** 1 where `c` lies left of the line from `a` to `b`, −1 right of it, 0 on it. */
export function sideOf(a: Whole, b: Whole, c: Whole): -1 | 0 | 1 {
  const left = (b[0] - a[0]) * (c[1] - a[1]);
  const right = (b[1] - a[1]) * (c[0] - a[0]);
  const doubt = 1e-15 * (Math.abs(left) + Math.abs(right));
  if (left - right > doubt) return 1;
  if (right - left > doubt) return -1;
  return signOf(
    (big(b[0]) - big(a[0])) * (big(c[1]) - big(a[1])) - (big(b[1]) - big(a[1])) * (big(c[0]) - big(a[0])),
  );
}

/** 1 where `d` lies inside the circle through `a`, `b`, `c` (anticlockwise), −1 outside, 0 on it. */
export function circleSideOf(a: Whole, b: Whole, c: Whole, d: Whole): -1 | 0 | 1 {
  const ax = a[0] - d[0];
  const ay = a[1] - d[1];
  const bx = b[0] - d[0];
  const by = b[1] - d[1];
  const cx = c[0] - d[0];
  const cy = c[1] - d[1];
  const aa = ax * ax + ay * ay;
  const bb = bx * bx + by * by;
  const cc = cx * cx + cy * cy;
  const value = aa * (bx * cy - cx * by) + bb * (cx * ay - ax * cy) + cc * (ax * by - bx * ay);
  const size =
    aa * (Math.abs(bx * cy) + Math.abs(cx * by)) +
    bb * (Math.abs(cx * ay) + Math.abs(ax * cy)) +
    cc * (Math.abs(ax * by) + Math.abs(bx * ay));
  // A float's error stays below a few units of the last place of this size; ten times that is beyond doubt.
  const doubt = 2e-14 * size;
  if (value > doubt) return 1;
  if (value < -doubt) return -1;
  const [AX, AY, BX, BY, CX, CY] = [big(ax), big(ay), big(bx), big(by), big(cx), big(cy)];
  return signOf(
    (AX * AX + AY * AY) * (BX * CY - CX * BY) +
      (BX * BX + BY * BY) * (CX * AY - AX * CY) +
      (CX * CX + CY * CY) * (AX * BY - BX * AY),
  );
}

const signOf = (value: bigint): -1 | 0 | 1 => (value > 0n ? 1 : value < 0n ? -1 : 0);
