import { cleanup, fireEvent, render, screen } from "@testing-library/react";
import { useState } from "react";
import { afterEach, describe, expect, it } from "vitest";
import { Checkbox } from "@/components/ui/checkbox";
import { Choice } from "@/components/ui/choice";
import { NumberInput } from "@/components/ui/number-input";
import { Select } from "@/components/ui/select";
import { TextInput } from "@/components/ui/text-input";

afterEach(cleanup);

const spoken = (control: HTMLElement): string =>
  (control.getAttribute("aria-describedby") ?? "")
    .split(" ")
    .filter(Boolean)
    .map((id) => document.getElementById(id)?.textContent)
    .join(" ");

describe("a field", () => {
  it("is found by its label with the unit, and reads its refusal before its hint", () => {
    render(<TextInput label="Breadth" unit="m" hint="On plan." error="It is at least 0.3 m." />);
    const field = screen.getByRole("textbox", { name: "Breadth (m)" });
    expect(field.getAttribute("aria-invalid")).toBe("true");
    expect(spoken(field)).toBe("It is at least 0.3 m. On plan.");
  });

  it("is required unless it says that it is optional", () => {
    render(
      <>
        <TextInput label="Mark" />
        <TextInput label="Remark" optional />
      </>,
    );
    expect(screen.getByLabelText("Mark").getAttribute("aria-required")).toBe("true");
    expect(screen.getByLabelText("Remark · optional").hasAttribute("aria-required")).toBe(false);
  });

  it("gives two fields of one label different ids, so that each label reaches its own", () => {
    render(
      <>
        <TextInput label="Level" defaultValue="upper" />
        <TextInput label="Level" defaultValue="lower" />
      </>,
    );
    const values = screen.getAllByLabelText("Level").map((field) => (field as HTMLInputElement).value);
    expect(values).toEqual(["upper", "lower"]);
  });
});

/** A form that keeps what the field reports, and shows it. */
function Pressure({ start = null }: { start?: number | null }) {
  const [value, setValue] = useState<number | null>(start);
  const [typed, setTyped] = useState("");
  return (
    <>
      <NumberInput
        label="Pressure"
        unit="kPa"
        value={value}
        onChange={(number, text) => {
          setValue(number);
          setTyped(text);
        }}
      />
      <output>{JSON.stringify({ value, typed })}</output>
      <button type="button" onClick={() => setValue(-2.4)}>
        From elsewhere
      </button>
    </>
  );
}

describe("a field for a number", () => {
  const field = () => screen.getByLabelText("Pressure (kPa)") as HTMLInputElement;
  const kept = () => JSON.parse(screen.getByRole("status").textContent ?? "");
  const type = (text: string) => fireEvent.change(field(), { target: { value: text } });

  it("keeps what is typed as it is typed, also a point with nothing behind it", () => {
    render(<Pressure />);
    type("150.");
    expect(field().value).toBe("150.");
    expect(kept()).toEqual({ value: 150, typed: "150." });
    type("150.40");
    expect(field().value).toBe("150.40");
    expect(kept().value).toBe(150.4);
  });

  it("keeps what is no number, answers with none, and says so when the field is left", () => {
    render(<Pressure start={150} />);
    type("1,5");
    expect(kept()).toEqual({ value: null, typed: "1,5" });
    expect(field().value).toBe("1,5");
    expect(field().hasAttribute("aria-invalid")).toBe(false);
    fireEvent.blur(field());
    expect(spoken(field())).toContain("with a point");
    expect(field().value).toBe("1,5");
  });

  it("shows a number that came from elsewhere, with a true minus", () => {
    render(<Pressure start={150} />);
    fireEvent.click(screen.getByRole("button"));
    expect(field().value).toBe("−2.4");
  });
});

describe("a question", () => {
  const ask = (value: "net" | "gross" | null, onChange = (_: "net" | "gross") => {}) =>
    render(
      <Choice
        label="Given as"
        error={value ? undefined : "Say whether it is net or gross."}
        answers={[
          { value: "net", label: "Net", hint: "Above existing overburden." },
          { value: "gross", label: "Gross" },
        ]}
        value={value}
        onChange={onChange}
      />,
    );

  it("has no answer of its own", () => {
    ask(null);
    const boxes = screen.getAllByRole("radio") as HTMLInputElement[];
    expect(boxes.map((box) => box.checked)).toEqual([false, false]);
    expect(spoken(screen.getByRole("radiogroup", { name: "Given as" }))).toBe(
      "Say whether it is net or gross.",
    );
  });

  it("reports the answer that is chosen and reads its hint with it", () => {
    const heard: string[] = [];
    ask(null, (answer) => heard.push(answer));
    fireEvent.click(screen.getByLabelText("Net"));
    expect(heard).toEqual(["net"]);
    expect(spoken(screen.getByLabelText("Net"))).toBe("Above existing overburden.");
  });
});

describe("a box and a list", () => {
  it("shows that some of what it stands for is chosen", () => {
    render(<Checkbox label="All footings" partly />);
    expect((screen.getByLabelText("All footings") as HTMLInputElement).indeterminate).toBe(true);
  });

  it("starts on its empty line, not on the first answer", () => {
    render(
      <Select
        label="Zone"
        placeholder="Choose a zone"
        options={[{ value: "a", label: "A" }]}
        defaultValue=""
      />,
    );
    expect((screen.getByLabelText("Zone") as HTMLSelectElement).value).toBe("");
  });
});
