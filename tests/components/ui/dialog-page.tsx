import { StrictMode, useState } from "react";
import { createRoot } from "react-dom/client";
import { Dialog } from "@/components/ui/dialog";

/** Three dialogs as pages use them: kept and closed, mounted while open, and one that may not be left. */
function DialogPage() {
  const [open, setOpen] = useState<"kept" | "mounted" | "held" | null>(null);
  const [asked, setAsked] = useState(0);
  const close = () => {
    setAsked((times) => times + 1);
    setOpen(null);
  };
  return (
    <>
      {(["kept", "mounted", "held"] as const).map((name) => (
        <button key={name} type="button" onClick={() => setOpen(name)}>
          Open {name}
        </button>
      ))}
      <output>{asked}</output>
      <Dialog title="Kept" open={open === "kept"} onClose={close}>
        <input aria-label="Reason" />
      </Dialog>
      {open === "mounted" && (
        <Dialog title="Mounted" open onClose={close}>
          <input aria-label="Reason" />
        </Dialog>
      )}
      <Dialog title="Held" open={open === "held"} held onClose={close}>
        <input aria-label="Reason" />
        <button type="button" onClick={() => setOpen(null)}>
          Stored
        </button>
      </Dialog>
    </>
  );
}

createRoot(document.body.appendChild(document.createElement("div"))).render(
  <StrictMode>
    <DialogPage />
  </StrictMode>,
);
