/** Stands under every calculation, on screen and on paper. */
export function Caution() {
  return (
    <p className="mt-8 max-w-prose border-t border-rule pt-3 text-ink-2">
      This check supports, and does not replace, the judgement of a licensed engineer; the local code governs.
      It assumes a rigid base and linear pressure. It does not cover rock joints, slopes, machines that
      vibrate, collapsible or expansive soils, mining or karst. The ground between holes is interpreted:
      inspect the formation.
    </p>
  );
}
