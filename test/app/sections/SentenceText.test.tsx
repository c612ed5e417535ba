import { render } from "@testing-library/react";
import { expect, it } from "vitest";
import { SentenceText } from "../../../src/app/sections/SentenceText.tsx";
import { symbolRuns } from "../../../src/core/symbolRuns.ts";
import { say } from "../../../src/export/sentences/piece.ts";

it("sets a sentence with its case's marker, its symbol, its value and its interval", () => {
  const sentence = say`Behind the ${{ kind: "case", mark: 0, name: "screen" }} ${{ kind: "symbol", runs: symbolRuns("x_{0}") }} = ${{ kind: "strong", text: "3.2" }} ${{ kind: "interval", text: "(2.1 to 4.1)" }}.`;
  const { container } = render(<SentenceText sentence={sentence} />);
  expect(container.textContent).toBe("Behind the screen x0 = 3.2 (2.1 to 4.1).");
  expect(container.querySelector(".case-name svg")).not.toBeNull();
  expect(container.querySelector(".sym sub")?.textContent).toBe("0");
  expect(container.querySelector("strong")?.textContent).toBe("3.2");
  expect(container.querySelector(".ci")?.textContent).toBe("(2.1 to 4.1)");
});
