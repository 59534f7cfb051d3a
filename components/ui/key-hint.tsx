/** Keys that do something here, as they stand on the keyboard: `Shift`, `↓`. Several are pressed together. */
export function KeyHint({ keys }: { keys: readonly string[] }) {
  return (
    <span className="whitespace-nowrap text-sm text-ink-2" data-screen-only>
      {keys.map((key, at) => (
        <span key={key}>
          {at > 0 && " + "}
          <kbd className="border border-field px-1 font-sans">{key}</kbd>
        </span>
      ))}
    </span>
  );
}
