// @vitest-environment jsdom
import { cleanup, fireEvent, render, screen, waitFor } from "@testing-library/react";
import { afterEach, beforeEach, describe, expect, it, vi } from "vitest";
import { AssignmentRow } from "@/app/(signed-in)/set-up/assignments/_components/assignment-row";
import { IndicatorEditor } from "@/app/(signed-in)/set-up/indicators/_components/indicator-editor";
import { WardForm } from "@/app/(signed-in)/set-up/wards/_components/ward-form";
import { FROM_THE_BEGINNING } from "@/lib/indicators/definition";
import { asMonth } from "@/lib/indicators/month";
import type { IndicatorReply } from "@/lib/schemas/indicator";
import type { WardReply } from "@/lib/schemas/ward";

const router = { push: vi.fn(), refresh: vi.fn() };
vi.mock("next/navigation", () => ({ useRouter: () => router }));

const sent = vi.fn<(url: string, method: string, body: unknown) => Response>();
beforeEach(() => {
  vi.stubGlobal("fetch", (url: string, init: { method: string; body: string }) =>
    Promise.resolve(sent(url, init.method, JSON.parse(init.body))),
  );
});
afterEach(() => {
  cleanup();
  vi.unstubAllGlobals();
  vi.resetAllMocks();
});

const type = (label: RegExp | string, value: string) =>
  fireEvent.change(screen.getByLabelText(label), { target: { value } });
const press = (name: RegExp | string) => fireEvent.click(screen.getByRole("button", { name }));
const answer = (status: number, content: unknown) => sent.mockReturnValue(Response.json(content, { status }));

const osier: WardReply = {
  code: "OSIER",
  name: "Osier",
  division: "Medicine",
  openFrom: asMonth("2024-01"),
  openTo: null,
  version: 3,
};

const hygiene: IndicatorReply = {
  code: "HH-OBS",
  name: "Hand hygiene missed",
  numeratorLabel: "Moments missed",
  denominatorLabel: "Moments seen",
  attribution: "",
  kind: "proportion",
  per: 100,
  betterWhen: "lower",
  team: "infection_control",
  numeratorBy: "ward",
  matureAfterDays: 0,
  sharedDenominator: null,
  limits: "auto",
  rules: [{ name: "beyond-action" }, { name: "one-side", length: 9 }],
  target: 0.07,
  version: 4,
  definitions: [
    {
      number: 1,
      effectiveFrom: FROM_THE_BEGINNING,
      numeratorLabel: "Moments missed",
      denominatorLabel: "Moments seen",
      attribution: "",
      comparable: true,
      reason: "First definition",
      decidedBy: "Test lead",
      decidedAt: "2026-12-07T09:00:00.000Z",
    },
  ],
};

describe("the form of a ward", () => {
  it("sends what the route takes and goes back to the list", async () => {
    answer(201, osier);
    render(<WardForm ward={null} />);
    type("Code", "osier");
    type("Name", " Osier ");
    type("Division", "Medicine");
    type("Open from", "2024-01");
    press("Add a ward");
    await waitFor(() => expect(router.push).toHaveBeenCalledWith("/set-up/wards"));
    const body = { code: "OSIER", name: "Osier", division: "Medicine", openFrom: "2024-01", openTo: null };
    expect(sent).toHaveBeenCalledExactlyOnceWith("/api/wards", "POST", body);
  });

  it("says at each field what needs fixing, and sends nothing", async () => {
    render(<WardForm ward={null} />);
    type("Code", "two words");
    press("Add a ward");
    await screen.findByText(/A code has 1 to 16/);
    expect(screen.getByLabelText("Code").getAttribute("aria-invalid")).toBe("true");
    expect(screen.getByText("Give the ward a name.")).toBeTruthy();
    expect(screen.getByText("Give a month as YYYY-MM.")).toBeTruthy();
    expect(sent).not.toHaveBeenCalled();
  });

  it("shows the server's refusal at its field", async () => {
    const errors = [{ path: "openTo", message: "Counts that were sent would fall outside." }];
    answer(409, { type: "/problems/conflict", title: "Conflict", status: 409, detail: "No.", errors });
    render(<WardForm ward={osier} />);
    type("Open until", "2025-01");
    press("Save changes");
    await screen.findByText("Counts that were sent would fall outside.");
    expect(screen.getByLabelText("Open until").getAttribute("aria-invalid")).toBe("true");
    expect(sent.mock.lastCall?.[2]).toMatchObject({ openTo: "2025-01", version: 3 });
    expect(router.push).not.toHaveBeenCalled();
  });

  it("shows two versions side by side, and keeps mine over the saved one only when told", async () => {
    const current = { ...osier, name: "Osier East", version: 4 };
    answer(409, { type: "/problems/stale", title: "Changed", status: 409, detail: "Changed.", current });
    render(<WardForm ward={osier} />);
    type("Name", "Osier West");
    press("Save changes");
    await screen.findByText("Name. You: Osier West. Saved meanwhile: Osier East.");
    press("Keep mine");
    expect(screen.getByRole("status").textContent).toContain("Save again");
    answer(200, current);
    press("Save changes");
    await waitFor(() => expect(router.push).toHaveBeenCalled());
    expect(sent.mock.lastCall?.[2]).toMatchObject({ name: "Osier West", version: 4 });
  });
});

describe("two versions of a ward", () => {
  it("takes the saved one when told, and sends nothing by itself", async () => {
    const current = { ...osier, name: "Osier East", version: 4 };
    answer(409, { type: "/problems/stale", title: "Changed", status: 409, detail: "Changed.", current });
    render(<WardForm ward={osier} />);
    type("Name", "Osier West");
    press("Save changes");
    await screen.findByText("Two versions.");
    press("Use the saved version");
    expect(screen.getByLabelText<HTMLInputElement>("Name").value).toBe("Osier East");
    expect(screen.queryByText("Two versions.")).toBeNull();
    expect(sent).toHaveBeenCalledOnce();
  });
});

describe("the form of an indicator", () => {
  const editor = (isCounted = false) =>
    render(<IndicatorEditor indicator={hygiene} isCounted={isCounted} sharedCodes={["BED-DAYS"]} />);

  it("adds one with the rules that are on by default", async () => {
    answer(201, hygiene);
    render(<IndicatorEditor indicator={null} isCounted={false} sharedCodes={[]} />);
    type("Code", "falls");
    type("Name", "Falls");
    type("What is counted", "Falls");
    type("Out of what", "Occupied bed days");
    fireEvent.click(screen.getByLabelText(/Events over exposure/));
    fireEvent.click(screen.getByLabelText("lower"));
    fireEvent.click(screen.getByLabelText("Quality team"));
    type("Shown as", "1000");
    type(/Shared denominator/, "bed-days");
    type(/Target/, "6.5");
    press("Add the indicator");
    await waitFor(() => expect(router.push).toHaveBeenCalledWith("/set-up/indicators"));
    expect(sent.mock.lastCall).toMatchObject([
      "/api/indicators",
      "POST",
      {
        code: "falls",
        kind: "rate",
        per: 1000,
        betterWhen: "lower",
        team: "quality",
        numeratorBy: "ward",
        matureAfterDays: 0,
        sharedDenominator: "bed-days",
        limits: "auto",
        target: 0.0065,
        rules: [{ name: "beyond-action" }, { name: "two-of-three" }, { name: "one-side", length: 8 }],
      },
    ]);
  });

  it("sends settings back as they were read, without asking for a version", async () => {
    answer(200, hygiene);
    editor();
    expect(screen.getByLabelText<HTMLInputElement>(/Target/).value).toBe("7");
    expect(screen.queryByLabelText("In force from")).toBeNull();
    press("Save changes");
    await waitFor(() => expect(sent).toHaveBeenCalled());
    const settings: Partial<IndicatorReply> = { ...hygiene };
    delete settings.definitions;
    delete settings.code;
    expect(sent).toHaveBeenCalledExactlyOnceWith("/api/indicators/HH-OBS", "PATCH", settings);
  });

  it("asks from when and whether months can be compared once words change", async () => {
    answer(200, hygiene);
    editor();
    type("What is counted", "Moments missed, surroundings too");
    type("In force from", "2027-01");
    type("Reason", "Surroundings added");
    fireEvent.click(screen.getByLabelText(/Not comparable/));
    press("Save as version 2");
    await waitFor(() => expect(sent).toHaveBeenCalled());
    expect(sent.mock.lastCall?.[2]).toMatchObject({
      numeratorLabel: "Moments missed, surroundings too",
      effectiveFrom: "2027-01",
      comparable: false,
      reason: "Surroundings added",
    });
  });

  it("shows what the server asks for at the fields of the version", async () => {
    const errors = ["effectiveFrom", "comparable", "reason"].map((path) => ({
      path,
      message: `Asked: ${path}`,
    }));
    answer(422, { type: "/problems/invalid", title: "Needs fixing", status: 422, detail: "No.", errors });
    editor();
    type("Out of what", "Moments observed");
    press("Save as version 2");
    for (const { message } of errors) expect(await screen.findByText(message)).toBeTruthy();
  });

  it("keeps the kind where counts fix it, and still saves the rest", async () => {
    answer(200, hygiene);
    editor(true);
    expect(screen.getByLabelText<HTMLInputElement>(/Part of the whole/).disabled).toBe(true);
    expect(screen.getByLabelText<HTMLInputElement>(/Part of the whole/).checked).toBe(true);
    type("Name", "Hygiene");
    press("Save changes");
    await waitFor(() => expect(sent).toHaveBeenCalled());
    expect(sent.mock.lastCall?.[2]).toMatchObject({
      name: "Hygiene",
      kind: "proportion",
      sharedDenominator: null,
    });
  });

  it("refuses an empty list of rules and numbers that are none", async () => {
    editor();
    fireEvent.click(screen.getByLabelText("A month outside an action limit"));
    fireEvent.click(screen.getByLabelText("A run on one side of the centre line"));
    type("Days until complete", "soon");
    press("Save changes");
    await screen.findByText("Keep at least one rule.");
    expect(screen.getByText("Give a number of days, 0 for none.")).toBeTruthy();
    expect(sent).not.toHaveBeenCalled();
  });

  it("shows the line as the ward will read it", () => {
    const { container } = editor();
    type("Out of what", "Moments observed");
    expect(container.querySelector(".as-read")?.textContent).toBe("Moments missedMoments observed");
  });
});

describe("a row of who counts what", () => {
  const row = (assignment: { from: string; version: number } | null) =>
    render(
      <AssignmentRow
        ward="OSIER"
        indicator="HH-OBS"
        name="Hand hygiene missed"
        note="HH-OBS"
        assignment={
          assignment && {
            ward: "OSIER",
            indicator: "HH-OBS",
            from: asMonth(assignment.from),
            to: null,
            version: assignment.version,
          }
        }
        open={{ from: "2024-01", to: null }}
      />,
    );

  it("assigns with version 0, so that somebody else's first one isn't overwritten", async () => {
    answer(200, {});
    row(null);
    expect(screen.getByText("HH-OBS, not counted here")).toBeTruthy();
    type("From", "2025-01");
    press("Assign: Hand hygiene missed");
    await screen.findByText("Saved.");
    const body = { from: "2025-01", to: null, version: 0 };
    expect(sent).toHaveBeenCalledExactlyOnceWith("/api/assignments/OSIER/HH-OBS", "PUT", body);
  });

  it("ends an assignment, and needs a first month", async () => {
    answer(200, {});
    row({ from: "2025-01", version: 2 });
    type("Until", "2024-12");
    press("Change: Hand hygiene missed");
    await screen.findByText("The last month can't come before the first.");
    type("Until", "2026-12");
    press("Change: Hand hygiene missed");
    await screen.findByText("Saved.");
    expect(sent.mock.lastCall?.[2]).toEqual({ from: "2025-01", to: "2026-12", version: 2 });
  });
});
