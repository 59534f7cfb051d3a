import { casesOf, type ReferenceCase } from "../reference-case";

const table = {
  breadths_m: [1, 2, 3],
  depths_m: [1, 2],
  netAllowable_kPa: [
    [200, 250, 280],
    [260, 320, 360],
  ],
};

export const valueTableCases: ReferenceCase[] = casesOf(
  {
    method: "value-table",
    citation: "Bilinear interpolation by hand",
    status: "computed independently",
    tolerance: { abs: 1e-9 },
  },
  [
    {
      id: "table-point",
      why: "gives a printed point itself",
      inputs: { ...table, breadth_m: 2, depth_m: 1 },
      expected: { netAllowable_kPa: 250, outside: false },
    },
    {
      id: "table-between",
      why: "lies in the middle of four points at 257.5 kPa",
      inputs: { ...table, breadth_m: 1.5, depth_m: 1.5 },
      expected: { netAllowable_kPa: (200 + 250 + 260 + 320) / 4, outside: false },
    },
    {
      id: "table-last-point",
      why: "still holds at its last breadth and depth",
      inputs: { ...table, breadth_m: 3, depth_m: 2 },
      expected: { netAllowable_kPa: 360, outside: false },
    },
    {
      id: "table-outside-breadth",
      why: "gives nothing beyond its last breadth",
      inputs: { ...table, breadth_m: 3.0001, depth_m: 1.5 },
      expected: { netAllowable_kPa: null, outside: true },
    },
    {
      id: "table-outside-depth",
      why: "gives nothing above its first depth",
      inputs: { ...table, breadth_m: 2, depth_m: 0.9 },
      expected: { netAllowable_kPa: null, outside: true },
    },
  ],
);
