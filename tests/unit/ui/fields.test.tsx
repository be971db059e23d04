// @vitest-environment jsdom
import { cleanup, render, screen, within } from "@testing-library/react";
import { afterEach, describe, expect, it } from "vitest";
import {
  Button,
  Cell,
  DataRow,
  DataTable,
  ErrorSummary,
  HeadCell,
  Notice,
  RadioGroup,
  RowHead,
  Select,
  TextArea,
  TextInput,
} from "@/app/_components/ui";

afterEach(cleanup);

/** The texts that a control is described by, in reading order. */
function descriptions(control: HTMLElement): string[] {
  const ids = control.getAttribute("aria-describedby")?.split(" ") ?? [];
  return ids.map((id) => document.getElementById(id)?.textContent?.trim() ?? `nothing has the id ${id}`);
}

describe("a field", () => {
  it("without trouble has its label and hint", () => {
    render(<TextInput id="count" label="Discharges" hint="All who left alive." numeric />);
    const box = screen.getByLabelText("Discharges");
    expect(descriptions(box)).toEqual(["All who left alive."]);
    expect(box.getAttribute("aria-invalid")).toBeNull();
    expect(box.getAttribute("inputmode")).toBe("numeric");
  });

  it.each([
    ["text box", <TextInput key="a" id="a" label="Reason" hint="A hint" error="Give a reason" />],
    ["text area", <TextArea key="b" id="b" label="Reason" hint="A hint" error="Give a reason" />],
    ["list", <Select key="c" id="c" label="Reason" hint="A hint" error="Give a reason" />],
  ])("a %s that needs fixing says so, the error first", (_, field) => {
    render(field);
    const control = screen.getByLabelText("Reason");
    expect(control.getAttribute("aria-invalid")).toBe("true");
    expect(descriptions(control)).toEqual(["Give a reason", "A hint"]);
  });

  it("has no description where there is nothing to describe", () => {
    render(<TextInput id="a" label="Reason" />);
    expect(screen.getByLabelText("Reason").hasAttribute("aria-describedby")).toBe(false);
  });
});

it("a group of radios has a legend, one choice and its error", () => {
  const options = [
    { value: "lower", label: "lower" },
    { value: "higher", label: "higher" },
  ];
  render(
    <RadioGroup
      id="better"
      name="better"
      label="Better when"
      options={options}
      defaultValue="higher"
      error="Choose"
    />,
  );
  const group = screen.getByRole("group", { name: "Better when" });
  expect(descriptions(group)).toEqual(["Choose"]);
  const chosen = within(group)
    .getAllByRole<HTMLInputElement>("radio")
    .map((radio) => radio.checked);
  expect(chosen).toEqual([false, true]);
});

it("the summary of errors links each to its control and counts them", () => {
  render(
    <>
      <ErrorSummary
        errors={[
          { fieldId: "a", words: "Give a reason" },
          { fieldId: "b", words: "Choose a month" },
        ]}
      />
      <TextInput id="a" label="Reason" />
    </>,
  );
  const alert = screen.getByRole("alert");
  expect(alert.textContent).toContain("2 things need fixing");
  const targets = within(alert)
    .getAllByRole("link")
    .map((link) => link.getAttribute("href"));
  expect(targets).toEqual(["#a", "#b"]);
  cleanup();
  const { container } = render(<ErrorSummary errors={[]} />);
  expect(container.innerHTML).toBe("");
});

it("a button doesn't send a form unless told to", () => {
  render(
    <>
      <Button>Cancel</Button>
      <Button type="submit" look="primary">
        Send return
      </Button>
    </>,
  );
  expect(screen.getByRole("button", { name: "Cancel" }).getAttribute("type")).toBe("button");
  const send = screen.getByRole("button", { name: "Send return" });
  expect([send.getAttribute("type"), send.className]).toEqual(["submit", "btn btn-primary"]);
});

it("a notice is read out only where it is asked to be", () => {
  render(<Notice>Quiet</Notice>);
  expect(screen.queryByRole("status")).toBeNull();
  render(
    <Notice live="status" mark="saved" title="Saved.">
      At 10:17
    </Notice>,
  );
  expect(screen.getByRole("status").textContent).toContain("Saved. At 10:17");
});

it("a table has its caption and scopes, and says which row is chosen", () => {
  render(
    <DataTable caption="People" hideCaption>
      <thead>
        <tr>
          <HeadCell>Name</HeadCell>
          <HeadCell numeric>Wards</HeadCell>
        </tr>
      </thead>
      <tbody>
        <DataRow tone="selected">
          <RowHead>Della Quarrie</RowHead>
          <Cell numeric workedOut>
            2
          </Cell>
        </DataRow>
      </tbody>
    </DataTable>,
  );
  const table = screen.getByRole("table", { name: "People" });
  expect(within(table).getAllByRole("columnheader")).toHaveLength(2);
  const row = within(table).getByRole("rowheader").closest("tr");
  expect(row?.getAttribute("aria-current")).toBe("true");
  expect(within(table).getByRole("cell").className).toBe("numeric worked-out");
});
