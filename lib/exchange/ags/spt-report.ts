import type { SptIncrement } from "./ground-model";

/** What the words of a penetration test say: "N=20 (1,2/4,5,5,6)", "N=50 (7,14/50 for 215mm)", "50/75mm". */
export interface SptReport {
  /** N stated or summed from four full increments; null on refusal. */
  readonly blowCount: number | null;
  readonly refusal: boolean;
  readonly mainBlows: number | null;
  readonly mainPenetration_mm: number | null;
  readonly seatingBlows: number | null;
  readonly seatingPenetration_mm: number | null;
  readonly increments: readonly SptIncrement[];
}

/** The main drive of a full test. */
export const fullDrive_mm = 300;
/** The seating drive of a full test, two increments of 75 mm. */
export const seatingDrive_mm = 150;
const increment_mm = 75;

const nothing: SptReport = {
  blowCount: null,
  refusal: false,
  mainBlows: null,
  mainPenetration_mm: null,
  seatingBlows: null,
  seatingPenetration_mm: null,
  increments: [],
};

/** Reads the words of a test; null where they do not follow a form that is known, so that nothing is guessed. */
export function readSptReport(text: string): SptReport | null {
  const tidy = text.trim().replace(/\s+/g, " ");
  if (tidy === "" || tidy.length > 200) return null;
  const whole = /^(?:N ?[=:]? ?)?(\d{1,3}) ?[([](.*?)\/(.*)[)\]]$/i.exec(tidy);
  if (whole) return fromDrives(Number(whole[1]), whole[2] ?? "", whole[3] ?? "");
  const refused = /^(?:N ?[=:]? ?)?(\d{1,3}) ?(?:blows )?(?:for|\/) ?(\d{1,3}(?:\.\d+)?) ?mm$/i.exec(tidy);
  if (refused) return fromMain(Number(refused[1]), Number(refused[2]));
  const alone = /^N ?[=:] ?(\d{1,3})$/i.exec(tidy);
  return alone ? { ...nothing, blowCount: Number(alone[1]), mainBlows: Number(alone[1]) } : null;
}

interface Drive {
  readonly blows: number;
  readonly penetration_mm: number | null;
  readonly increments: readonly SptIncrement[];
}

function fromDrives(stated: number, seatingText: string, mainText: string): SptReport | null {
  const seating = readDrive(seatingText, 2);
  const main = readDrive(mainText, 4);
  if (!main || !seating) return null;
  const short = main.penetration_mm !== null && main.penetration_mm < fullDrive_mm;
  const refusal = short || (main.penetration_mm === null && main.increments.length < 4);
  const increments = [...seating.increments, ...main.increments];
  return {
    blowCount: refusal ? null : stated,
    refusal,
    mainBlows: main.blows,
    mainPenetration_mm: main.penetration_mm ?? (main.increments.length === 4 ? fullDrive_mm : null),
    seatingBlows: seating.blows,
    seatingPenetration_mm:
      seating.penetration_mm ?? (seating.increments.length === 2 ? seatingDrive_mm : null),
    increments: seating.increments.length > 0 && main.increments.length > 0 ? increments : [],
  };
}

/** A drive is "50 for 215mm", or blows for increments of 75 mm: "4,5,5,6". */
function readDrive(text: string, most: number): Drive | null {
  const short = /^ ?(\d{1,3}) ?(?:blows )?for ?(\d{1,3}(?:\.\d+)?) ?mm ?$/i.exec(text);
  if (short) return { blows: Number(short[1]), penetration_mm: Number(short[2]), increments: [] };
  const parts = text.split(",").map((part) => part.trim());
  if (parts.length > most || !parts.every((part) => /^\d{1,3}$/.test(part))) return null;
  const increments = parts.map((part) => ({ blows: Number(part), penetration_mm: increment_mm }));
  return { blows: increments.reduce((sum, { blows }) => sum + blows, 0), penetration_mm: null, increments };
}

function fromMain(blows: number, penetration_mm: number): SptReport {
  const refusal = penetration_mm < fullDrive_mm;
  return {
    ...nothing,
    blowCount: refusal ? null : blows,
    refusal,
    mainBlows: blows,
    mainPenetration_mm: penetration_mm,
  };
}
