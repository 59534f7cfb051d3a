import { casesOf, type ReferenceCase } from "../reference-case";
import { PSF_kPa } from "../source-units";

const IBC =
  "International Building Code 2012, Table 1806.2, as reprinted in R. W. Day, Geotechnical Earthquake Engineering Handbook, Table 14.6";

const BS = "BS 8004:1986, Table 1 (withdrawn 2015), in a secondary copy";

export const presumptiveCases: ReferenceCase[] = [
  ...casesOf(
    {
      method: "presumptive-bearing",
      citation: IBC,
      status: "read in a secondary copy",
      tolerance: { rel: 1e-3 },
    },
    (
      [
        ["1", 12000],
        ["2", 4000],
        ["3", 3000],
        ["4", 2000],
        ["5", 1500],
      ] as const
    ).map(([soilClass, psf]) => ({
      id: `presumed-ibc-${soilClass}`,
      why: `presumes ${psf} psf for class ${soilClass}`,
      inputs: { standard: "ibc-1806.2", soilClass },
      expected: { min_kPa: psf * PSF_kPa, max_kPa: psf * PSF_kPa },
    })),
  ),
  ...casesOf(
    {
      method: "presumptive-bearing",
      citation: BS,
      status: "read in a secondary copy",
      tolerance: { abs: 0 },
    },
    (
      [
        ["dense-gravel", 600, null],
        ["medium-dense-gravel", 200, 600],
        ["loose-gravel", null, 200],
        ["compact-sand", 300, null],
        ["medium-dense-sand", 100, 300],
        ["loose-sand", null, 100],
        ["hard-clay", 300, 600],
        ["stiff-clay", 150, 300],
        ["firm-clay", 75, 150],
        ["soft-clay", null, 75],
      ] as const
    ).map(([soilClass, min_kPa, max_kPa]) => ({
      id: `presumed-bs8004-${soilClass}`,
      why: `presumes ${min_kPa ?? "less than"} ${min_kPa === null ? "" : max_kPa === null ? "or more" : "to"} ${max_kPa ?? ""} kPa for ${soilClass.replaceAll("-", " ")}`,
      inputs: { standard: "bs8004-1986", soilClass },
      expected: { min_kPa, max_kPa },
    })),
  ),
];
