/** Colours of a drawing: the sheet's own names, each with what it is without them (a figure saved on its own). */
export const INK = "var(--ink, #1B2326)";
export const INK_2 = "var(--ink-2, #56615F)";
export const SHEET = "var(--sheet, #FFFEFB)";
export const RULE = "var(--rule, #D4CFC2)";
export const ACTION = "var(--action, #0072B2)";
export const PASSES = "var(--passes, #009E73)";
export const FAILS = "var(--fails, #D55E00)";
export const AFFECTED = "var(--affected, #E69F00)";
export const OUTSIDE = "var(--outside, #CC79A7)";

/** Ink on orange, light or dark around it. */
export const INK_ON_COLOUR = "#1B2326";

/** The face of all lettering; its digits are all of one width. */
export const FACE = "'Roboto Variable', Roboto, 'DejaVu Sans', sans-serif";

/** Heights of lettering in a figure, in pixels of the drawing. */
export const TEXT_PX = 12;
export const SMALL_PX = 11;
