/** A small file of an invented site, with CR LF, that breaks no rule. */
export const exampleLines: readonly string[] = [
  '"GROUP","PROJ"',
  '"HEADING","PROJ_ID","PROJ_NAME"',
  '"UNIT","",""',
  '"TYPE","ID","X"',
  '"DATA","P-17","Mill Lane depot"',
  "",
  '"GROUP","TRAN"',
  '"HEADING","TRAN_ISNO","TRAN_DATE","TRAN_PROD","TRAN_STAT","TRAN_AGS","TRAN_RECV","TRAN_DLIM","TRAN_RCON"',
  '"UNIT","","yyyy-mm-dd","","","","","",""',
  '"TYPE","X","DT","X","X","X","X","X","X"',
  '"DATA","2","2024-03-05","Boring Works","Final","4.1.1","Design office","|","+"',
  "",
  '"GROUP","TYPE"',
  '"HEADING","TYPE_TYPE","TYPE_DESC"',
  '"UNIT","",""',
  '"TYPE","X","X"',
  '"DATA","ID","Identifier"',
  '"DATA","X","Text"',
  '"DATA","XN","Text or number"',
  '"DATA","DT","Date"',
  '"DATA","PA","Code"',
  '"DATA","0DP","Whole number"',
  '"DATA","2DP","Two places"',
  "",
  '"GROUP","UNIT"',
  '"HEADING","UNIT_UNIT","UNIT_DESC"',
  '"UNIT","",""',
  '"TYPE","X","X"',
  '"DATA","m","metre"',
  '"DATA","mm","millimetre"',
  '"DATA","min","minute"',
  '"DATA","yyyy-mm-dd","date"',
  "",
  '"GROUP","ABBR"',
  '"HEADING","ABBR_HDNG","ABBR_CODE","ABBR_DESC"',
  '"UNIT","","",""',
  '"TYPE","X","X","X"',
  '"DATA","LOCA_TYPE","CP","Cable percussion"',
  '"DATA","LOCA_TYPE","RC","Rotary core"',
  '"DATA","LOCA_STAT","FINAL","Final"',
  '"DATA","GEOL_LEG","102","Made ground"',
  '"DATA","GEOL_LEG","202","Clay"',
  '"DATA","ISPT_TYPE","S","Split spoon"',
  "",
  '"GROUP","LOCA"',
  '"HEADING","LOCA_ID","LOCA_TYPE","LOCA_STAT","LOCA_NATE","LOCA_NATN","LOCA_GL","LOCA_FDEP","LOCA_STAR"',
  '"UNIT","","","","m","m","m","m","yyyy-mm-dd"',
  '"TYPE","ID","PA","PA","2DP","2DP","2DP","2DP","DT"',
  '"DATA","BH1","CP+RC","FINAL","1000.00","2000.50","16.20","6.00","2024-02-01"',
  '"DATA","BH2","CP","FINAL","1010.00","2000.50","16.40","5.00","2024-02-02"',
  "",
  '"GROUP","GEOL"',
  '"HEADING","LOCA_ID","GEOL_TOP","GEOL_BASE","GEOL_DESC","GEOL_LEG"',
  '"UNIT","","m","m","",""',
  '"TYPE","ID","2DP","2DP","X","PA"',
  '"DATA","BH1","0.00","1.20","MADE GROUND: brick and ""ash"", loose.","102"',
  '"DATA","BH1","1.20","6.00","Firm brown CLAY.","202"',
  '"DATA","BH2","0.00","5.00","Firm brown CLAY.","202"',
  "",
  '"GROUP","ISPT"',
  '"HEADING","LOCA_ID","ISPT_TOP","ISPT_SEAT","ISPT_MAIN","ISPT_NPEN","ISPT_NVAL","ISPT_REP","ISPT_WAT","ISPT_TYPE"',
  '"UNIT","","m","","","mm","","","m",""',
  '"TYPE","ID","2DP","0DP","0DP","0DP","0DP","X","XN","PA"',
  '"DATA","BH1","2.00","3","20","450","20","N=20 (1,2/4,5,5,6)","Dry","S"',
  '"DATA","BH1","4.00","21","50","365","","N=50 (7,14/50 for 215mm)","1.80","S"',
  "",
  '"GROUP","WSTG"',
  '"HEADING","LOCA_ID","WSTG_DPTH","WSTG_REM"',
  '"UNIT","","m",""',
  '"TYPE","ID","2DP","X"',
  '"DATA","BH1","2.90","Slow inflow"',
  "",
  '"GROUP","WSTD"',
  '"HEADING","LOCA_ID","WSTG_DPTH","WSTD_NMIN","WSTD_POST"',
  '"UNIT","","m","min","m"',
  '"TYPE","ID","2DP","0DP","2DP"',
  '"DATA","BH1","2.90","10","2.60"',
  '"DATA","BH1","2.90","20","2.40"',
];

/** The example with some lines replaced, as bytes. A replacement of null takes the line out. */
export function exampleBytes(
  changes: Readonly<Record<string, string | null>> = {},
  lineEnd = "\r\n",
): Uint8Array {
  const unused = new Set(Object.keys(changes));
  const lines = exampleLines.flatMap((line) => {
    if (!Object.hasOwn(changes, line)) return [line];
    unused.delete(line);
    return changes[line] ?? [];
  });
  if (unused.size > 0) throw new Error(`The example has no line ${[...unused][0]}`);
  return new TextEncoder().encode(lines.map((line) => line + lineEnd).join(""));
}

/** Line number of a line of the example, counted from 1. */
export function lineOf(line: string): number {
  const at = exampleLines.indexOf(line);
  if (at === -1) throw new Error(`The example has no line ${line}`);
  return at + 1;
}
