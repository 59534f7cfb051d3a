import { Caution } from "@/components/ui/caution";

/** Stands under every check of a footing: the caution, and what this engine leaves out. */
export function CheckCaution() {
  return (
    <Caution className="mt-8 border-t border-rule pt-3">
      The check assumes a rigid base and linear pressure. It does not cover rock joints, slopes, machines that
      vibrate, collapsible or expansive soils, mining or karst. The ground between holes is interpreted:
      inspect the formation.
    </Caution>
  );
}
