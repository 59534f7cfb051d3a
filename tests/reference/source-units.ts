/** Units that sources print in, as SI (international foot and pound; short ton). */
export const FOOT_m = 0.3048;
export const INCH_m = 0.0254;
export const POUND_kN = 0.0044482216152605;
export const KIP_kN = 4.4482216152605;
export const PSF_kPa = 0.04788025898;
export const KSF_kPa = 47.88025898;
export const PSI_kPa = 6.894757293;
export const TSF_kPa = 95.76051796;
export const PCF_kNm3 = 0.15708746385;
/** One kip foot in kNm. */
export const KIP_FOOT_kNm = KIP_kN * FOOT_m;
