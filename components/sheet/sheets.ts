/** One sheet of a project: its number, which is also its key, its name and the last part of its address. */
export type Sheet = { number: number; name: string; path: string };

/** The index of sheets. A number stays with its sheet, as on a drawing list. */
export const sheets: readonly Sheet[] = [
  { number: 1, name: "Plan", path: "plan" },
  { number: 2, name: "Holes", path: "holes" },
  { number: 3, name: "Documents", path: "documents" },
  { number: 4, name: "Bearing values", path: "values" },
  { number: 5, name: "Footings", path: "footings" },
  { number: 6, name: "Revisions", path: "revisions" },
  { number: 8, name: "Settings", path: "settings" },
];

/** The sheet that an address lies on; undefined outside all of them. */
export const sheetAt = (pathname: string): Sheet | undefined => {
  const part = /^\/projects\/[^/]+\/([^/]+)/.exec(pathname)?.[1];
  return sheets.find(({ path }) => path === part);
};
