import type { ReactElement } from "react";
import { renderToStaticMarkup } from "react-dom/server";
import { createMemoryRouter, RouterProvider } from "react-router";
import { expect, test } from "vitest";
import { loader } from "~/routes/pieces/pieces";
import { Dial } from "~/ui/dial/dial";
import { angleOf, onStep, pointAt, valueAt } from "~/ui/dial/dial-geometry";
import { ErrorSummary } from "~/ui/error-summary";
import { AmountField } from "~/ui/fields/amount-field";
import { plainField } from "~/ui/fields/field-shape";
import { KeyTag } from "~/ui/key-tag";
import { Time } from "~/ui/time";

function render(piece: ReactElement): string {
  const router = createMemoryRouter([{ path: "/", element: piece }]);
  return renderToStaticMarkup(<RouterProvider router={router} />);
}

const scale = { unit: "inHg", max: 30, numbered: 10 };
const gauge = { vacuum: scale, pressure: { unit: "psi", max: 30, numbered: 10 } };

test("a dial says nothing of the usual value before one is entered", () => {
  const props = {
    ...gauge,
    side: "vacuum" as const,
    label: "Vacuum relief",
    usual: "20.5 to 21.5",
  };
  const verdict = () => ({ tone: "good" as const, title: "Inside 19 to 23." });
  const unset = render(<Dial {...props} field={plainField("relief")} verdict={verdict} />);
  expect(unset).not.toContain("20.5 to 21.5");
  expect(unset).toContain('aria-valuetext="Not read yet"');
  const read = render(
    <Dial {...props} field={plainField("relief", { value: "21.0" })} verdict={verdict} />,
  );
  expect(read).toContain("20.5 to 21.5");
  expect(read).toContain('aria-valuetext="21.0 inHg"');
  expect(read).toMatch(/<input[^>]*name="relief"[^>]*value="21.0"/);
});

test("a dial keeps what was typed although it is off the gauge", () => {
  const markup = render(
    <Dial {...gauge} side="vacuum" label="Relief" field={plainField("relief", { value: "44" })} />,
  );
  expect(markup).toContain('value="44"');
  expect(markup).toContain("It reads 0 to 30 inHg");
});

test("vacuum runs left of zero and pressure right of it", () => {
  expect(angleOf(0, scale, "vacuum")).toBeCloseTo(0);
  expect(angleOf(30, scale, "vacuum")).toBe(-135);
  expect(angleOf(30, scale, "pressure")).toBe(135);
  expect(angleOf(99, scale, "pressure")).toBe(135);
});

test("the needle lands on the half unit under the finger, and stays on its side of zero", () => {
  for (const side of ["vacuum", "pressure"] as const) {
    for (let value = 0; value <= 30; value += 0.5) {
      const [x, y] = pointAt(angleOf(value, scale, side), 120);
      expect(valueAt(x - 160, y - 160, scale, side, 0.5)).toBeCloseTo(value);
    }
  }
  expect(valueAt(50, -10, scale, "vacuum", 0.5)).toBe(0);
  expect(onStep(30.4, scale, 0.5)).toBe(30);
});

test("a standing is a word, never its drawing or color alone", () => {
  const words = {
    held: "Held",
    "walk-due": "Walk due",
    limited: "Limited",
    cleared: "Cleared",
    out: "Out",
  };
  for (const [standing, word] of Object.entries(words)) {
    const markup = render(<KeyTag unit="T-118" standing={standing as keyof typeof words} />);
    expect(markup).toContain(word);
    expect(markup).not.toMatch(/<svg(?![^>]*aria-hidden="true")/);
  }
});

test("red tags past the second are counted on the key tag", () => {
  const red = ["Float ball missing", "Glass cracked", "Hose chafed", "Lamp out"].map((title) => ({
    id: title,
    title,
  }));
  const markup = render(<KeyTag unit="T-118" standing="held" red={red} />);
  expect(markup).toContain("Float ball missing");
  expect(markup).toContain("2 more red tags");
});

test("a field is tied to its label, its fault first and its hint after", () => {
  const field = plainField("stop", { value: "29", errors: ["Enter 27 or less."] });
  const unit = plainField("stop-unit", { value: "inHg" });
  const markup = render(
    <AmountField
      field={field}
      unit={unit}
      units={[{ value: "inHg", label: "inHg" }]}
      label="Stop value"
      hint="The lowest of tank, pump and gauge."
    />,
  );
  expect(markup).toContain('aria-describedby="stop-error stop-description"');
  expect(markup).toContain('aria-invalid="true"');
  expect(markup).toContain('<label for="stop"');
  expect(markup).toContain('value="29"');
});

test("the error summary names and links every field that needs another look, and no other", () => {
  const markup = render(
    <ErrorSummary
      fields={[
        ["Unit number", plainField("unit", { errors: ["Write it as it is painted."] })],
        ["Yard", plainField("yard")],
      ]}
    />,
  );
  expect(markup).toContain('href="#unit"');
  expect(markup).toContain("Unit number: Write it as it is painted.");
  expect(markup).not.toContain("#yard");
});

test("a time is told on the yard's clock", () => {
  const at = new Date("2026-12-01T06:20:00Z");
  expect(render(<Time at={at} zone="America/Denver" />)).toContain("Nov 30, 23:20");
  expect(render(<Time at={at} zone="America/New_York" show="clock" />)).toContain("01:20");
});

test("the page of pieces is not there in production unless it is asked for", () => {
  const asked = process.env.KEYPEG_PIECES;
  const { DEV } = import.meta.env;
  try {
    import.meta.env.DEV = false;
    delete process.env.KEYPEG_PIECES;
    expect(() => loader({} as Parameters<typeof loader>[0])).toThrow();
    process.env.KEYPEG_PIECES = "1";
    expect(loader({} as Parameters<typeof loader>[0])).toBeNull();
  } finally {
    import.meta.env.DEV = DEV;
    if (asked === undefined) delete process.env.KEYPEG_PIECES;
    else process.env.KEYPEG_PIECES = asked;
  }
});
