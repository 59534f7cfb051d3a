import type { Config } from "tailwindcss";

/** The drawing office: names of paper, ink and signs. What each is by day and by night stands in app/globals.css. */
const config: Config = {
  content: [],
  theme: {
    extend: {
      colors: {
        paper: "var(--paper)",
        sheet: "var(--sheet)",
        ink: "var(--ink)",
        "ink-2": "var(--ink-2)",
        rule: "var(--rule)",
        frame: "var(--frame)",
        field: "var(--field)",
        action: "var(--action)",
        "on-action": "var(--on-action)",
        chosen: "var(--chosen)",
        passes: "var(--passes)",
        fails: "var(--fails)",
        "fails-text": "var(--fails-text)",
        affected: "var(--affected)",
        outside: "var(--outside)",
      },
      fontFamily: {
        sans: ["Roboto Variable", "Roboto", "DejaVu Sans", "sans-serif"],
        formula: ["STIX Two Text", "Cambria", "Times New Roman", "serif"],
      },
      // Three sizes of lettering, as on a drawing: notes, body, title. A section heading is body in a heavier stroke.
      fontSize: {
        xs: ["0.75rem", "1rem"],
        sm: ["0.75rem", "1rem"],
        base: ["0.875rem", "1.25rem"],
        lg: ["0.875rem", { lineHeight: "1.25rem", fontWeight: "650" }],
        xl: ["1.25rem", { lineHeight: "1.75rem", fontWeight: "500" }],
      },
    },
  },
};

export default config;
