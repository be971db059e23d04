import { describe, expect, it } from "vitest";
import { readUploadedFile } from "@/app/api/imports/_upload";
import { MAX_UPLOAD_BYTES } from "@/lib/workbook";
import { person } from "../support/actors";
import { refusal } from "../support/import-hospital";

const lead = person("quality_lead", "Test lead");

const post = (body: FormData | string, headers: Record<string, string> = {}) =>
  new Request("http://ebbline.test/api/imports", { method: "POST", body, headers });

function form(...files: [field: string, name: string, content: string][]): FormData {
  const data = new FormData();
  for (const [field, name, content] of files) data.append(field, new File([content], name));
  return data;
}

describe("the uploaded file", () => {
  it("is taken from a form with its name, without a path", async () => {
    const file = await readUploadedFile(
      lead,
      post(form(["file", "C:\\counts\\november.csv", "Ward;Month\r\n"])),
    );
    expect(file.fileName).toBe("november.csv");
    expect(new TextDecoder().decode(file.bytes)).toBe("Ward;Month\r\n");
  });

  it("must be exactly one, in the field called file", async () => {
    for (const data of [
      form(),
      form(["other", "a.csv", "x"]),
      form(["file", "a.csv", "x"], ["file", "b.csv", "x"]),
      form(["file", "a.csv", "x"], ["more", "b.csv", "x"]),
    ]) {
      data.append("comment", "text is no file");
      expect((await refusal(readUploadedFile(lead, post(data)))).errors[0]?.path).toBe("file");
    }
  });

  it("is refused as another type, as a broken form, and beyond the limit", async () => {
    const json = post("{}", { "Content-Type": "application/json" });
    expect((await refusal(readUploadedFile(lead, json))).code).toBe("unsupported-type");
    const broken = post("no form at all", { "Content-Type": "multipart/form-data; boundary=x" });
    expect((await refusal(readUploadedFile(lead, broken))).code).toBe("invalid");
    const large = post(form(["file", "a.csv", "x".repeat(MAX_UPLOAD_BYTES + 70_000)]));
    expect((await refusal(readUploadedFile(lead, large))).code).toBe("too-large");
  });

  it("is not even read for whoever may not bring sheets in", async () => {
    const request = post(form(["file", "a.csv", "x"]));
    const refused = await refusal(readUploadedFile(person("board_member", "Board"), request));
    expect(refused.code).toBe("forbidden");
    expect(request.bodyUsed).toBe(false);
  });
});
