import type { PrincipalSoil, SoilReading } from "./ground-model";

// The legend code has three digits; the first is the principal material, and from 801 on the code is the rock itself.
const byHundreds: Readonly<Record<string, PrincipalSoil>> = {
  "2": "clay",
  "3": "silt",
  "4": "sand",
  "5": "gravel",
  "6": "peat",
  "7": "cobbles",
  "8": "rock",
};
const rocks: Readonly<Record<string, PrincipalSoil>> = {
  "801": "mudstone",
  "802": "siltstone",
  "803": "sandstone",
  "804": "limestone",
  "805": "chalk",
  "806": "coal",
  "807": "breccia",
  "808": "conglomerate",
  "809": "igneous",
  "810": "igneous",
  "811": "igneous",
  "812": "metamorphic",
  "813": "metamorphic",
  "814": "metamorphic",
  "815": "igneous",
  "817": "mudstone",
  "819": "metamorphic",
};

const madeGroundWords =
  /\b(MADE GROUND|FILL|BACKFILL|MADE-GROUND|HARDCORE|RUBBLE|TARMAC(ADAM)?|ASPHALT|BITMAC|MACADAM)\b/;
const lowerMadeGround = /^\W*(made ground|fill|possible made ground|probable made ground|reworked)\b/i;
const organicWords = /\b(peat|peaty|organic|amorphous|fibrous|humic)\b/i;

/** Nouns of the principal material; the ones further down are taken where none above is found. */
const nouns: readonly (readonly [PrincipalSoil, RegExp])[] = [
  ["void", /\b(VOID|NO RECOVERY|CAVITY)\b/],
  ["concrete", /\bCONCRETE\b/],
  ["topsoil", /\b(TOPSOIL|TOP SOIL|TURF)\b/],
  ["mudstone", /\b(MUDSTONE|CLAYSTONE|SHALE|MARL(STONE)?|MUDROCK)S?\b/],
  ["siltstone", /\bSILTSTONES?\b/],
  ["sandstone", /\b(SANDSTONE|GREYWACKE|GRITSTONE)S?\b/],
  ["limestone", /\b(LIMESTONE|DOLOMITE|DOLOSTONE|OOLITE)S?\b/],
  ["chalk", /\bCHALK\b/],
  ["coal", /\b(COAL|LIGNITE)\b/],
  ["breccia", /\bBRECCIA\b/],
  ["conglomerate", /\bCONGLOMERATE\b/],
  ["igneous", /\b(GRANITE|BASALT|DOLERITE|GABBRO|ANDESITE|RHYOLITE|DIORITE|GRANODIORITE|TUFF|AGGLOMERATE)\b/],
  ["metamorphic", /\b(SLATE|SCHIST|GNEISS|PHYLLITE|QUARTZITE|MARBLE|HORNFELS)\b/],
  ["rock", /\b(BEDROCK|ROCK)\b/],
  ["peat", /\bPEATS?\b/],
  ["clay", /\bCLAYS?\b/],
  ["silt", /\bSILTS?\b/],
  ["sand", /\bSANDS?\b/],
  ["gravel", /\bGRAVELS?\b/],
  ["cobbles", /\b(COBBLES?|BOULDERS?)\b/],
];
const rockKinds = new Set<PrincipalSoil>([
  "mudstone",
  "siltstone",
  "sandstone",
  "limestone",
  "chalk",
  "coal",
  "breccia",
  "conglomerate",
  "igneous",
  "metamorphic",
  "rock",
]);

/**
 * Reads the principal soil or rock of a stratum: from the first digit of its legend code, else from the words of the
 * description, where capitals mark the principal noun. A help for the hatch, read by machine, for an engineer to confirm.
 */
export function readPrincipalSoil(legendCode: string, description: string): SoilReading {
  const said = soilFromWords(description);
  const coded = soilFromCode(legendCode.trim(), said);
  const soil = coded ?? said ?? "unknown";
  const inWords = madeGroundWords.test(description) || lowerMadeGround.test(description);
  return {
    soil,
    madeGround:
      soil === "made-ground" || (inWords && !rockKinds.has(soil)) || /^10[2-9]$/.test(legendCode.trim()),
    organic: soil === "peat" || soil === "topsoil" || organicWords.test(description),
    readFrom: coded ? "legend code" : said ? "description" : "nothing",
    machineRead: true,
  };
}

function soilFromCode(code: string, said: PrincipalSoil | null): PrincipalSoil | null {
  if (!/^[1-8]\d\d$/.test(code)) return null;
  if (code === "101") return "topsoil";
  if (code === "104") return said === "made-ground" ? "made-ground" : "concrete";
  if (code.startsWith("1")) return "made-ground";
  return rocks[code] ?? byHundreds[code.charAt(0)] ?? null;
}

function soilFromWords(description: string): PrincipalSoil | null {
  if (madeGroundWords.test(description) || lowerMadeGround.test(description)) return "made-ground";
  const head = description.slice(0, 2000);
  const capitals = firstNoun(head);
  if (capitals) return capitals;
  // Some logs write no capitals, or nothing else: the last noun before "with" or "of" is then the principal one.
  const clause = (head.split(/[.;:(]|\b(?:with|of|containing|including)\b/i)[0] ?? "").toUpperCase();
  let found: { soil: PrincipalSoil; at: number } | null = null;
  for (const [soil, noun] of nouns) {
    const at = lastIndexOf(clause, noun);
    if (at >= 0 && (found === null || at > found.at)) found = { soil, at };
  }
  return found?.soil ?? null;
}

/** The first capital noun of the text; made of two ("SAND and GRAVEL"), the first is the one that rules. */
function firstNoun(text: string): PrincipalSoil | null {
  let found: { soil: PrincipalSoil; at: number } | null = null;
  const wholeInCapitals = !/[a-z]/.test(text);
  if (wholeInCapitals) return null;
  for (const [soil, noun] of nouns) {
    const at = text.search(noun);
    if (at >= 0 && (found === null || at < found.at)) found = { soil, at };
  }
  return found?.soil ?? null;
}

function lastIndexOf(text: string, noun: RegExp): number {
  let last = -1;
  for (const match of text.matchAll(new RegExp(noun.source, "g"))) last = match.index;
  return last;
}
