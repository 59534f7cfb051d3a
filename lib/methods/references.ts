/** Every source once. `seen` says how far we could check it: nobody should take a recalled figure for a printed one. */
export const references = {
  statics: {
    author: "—",
    title: "Statics of a rigid base on ground that carries no tension, with linear pressure",
    edition: "derived here",
    year: null,
    seen: "derived and checked against independent solvers",
  },
  meyerhof1953: {
    author: "G. G. Meyerhof",
    title: "The bearing capacity of foundations under eccentric and inclined loads, Proc. 3rd ICSMFE, Zürich",
    edition: "vol. 1",
    year: 1953,
    seen: "from memory",
  },
  meyerhof1963: {
    author: "G. G. Meyerhof",
    title: "Some recent research on the bearing capacity of foundations, Canadian Geotechnical Journal 1(1)",
    edition: "",
    year: 1963,
    seen: "in transcription; not checked against the printed page",
  },
  terzaghi1943: {
    author: "K. Terzaghi",
    title: "Theoretical Soil Mechanics",
    edition: "Wiley",
    year: 1943,
    seen: "in transcription; not checked against the printed page",
  },
  kumbhojkar1993: {
    author: "A. S. Kumbhojkar",
    title: "Numerical evaluation of Terzaghi's Nγ, Journal of Geotechnical Engineering 119(3)",
    edition: "",
    year: 1993,
    seen: "in transcription; not checked against the printed page",
  },
  hansen1970: {
    author: "J. Brinch Hansen",
    title: "A revised and extended formula for bearing capacity, Danish Geotechnical Institute Bulletin 28",
    edition: "",
    year: 1970,
    seen: "in transcription; not checked against the printed page",
  },
  vesic1973: {
    author: "A. S. Vesić",
    title: "Analysis of ultimate loads of shallow foundations, Journal of the SMFD 99(SM1)",
    edition: "",
    year: 1973,
    seen: "in transcription; not checked against the printed page",
  },
  en1997: {
    author: "CEN",
    title: "EN 1997-1 Geotechnical design, general rules",
    edition: "2004, Annex D (informative) and section 6",
    year: 2004,
    seen: "in transcription; not checked against the printed page",
  },
  gec6: {
    author: "R. E. Kimmerling, US Federal Highway Administration",
    title: "Geotechnical Engineering Circular No. 6, Shallow Foundations, FHWA-SA-02-054",
    edition: "",
    year: 2002,
    seen: "in transcription; not checked against the printed page",
  },
  practice: {
    author: "—",
    title: "Common practice",
    edition: "",
    year: null,
    seen: "common practice; no source",
  },
} as const;

export type ReferenceKey = keyof typeof references;
