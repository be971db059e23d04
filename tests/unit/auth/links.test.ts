import { describe, expect, it } from "vitest";
import { linksFor } from "@/app/(signed-in)/_components/links";
import { person } from "@/tests/support/actors";

const paths = (role: Parameters<typeof person>[0]) =>
  linksFor(person(role, "Somebody")).map((link) => link.href);

describe("the masthead's links", () => {
  it("are those of the role's work", () => {
    expect(paths("board_member")).toEqual(["/packs"]);
    expect(paths("ward_nurse")).toEqual(["/", "/returns", "/charts", "/signals", "/imports", "/packs"]);
    expect(paths("infection_control")).toEqual(["/", "/returns", "/charts", "/signals", "/packs"]);
    expect(paths("quality_lead")).toEqual([
      "/",
      "/returns",
      "/charts",
      "/signals",
      "/imports",
      "/packs",
      "/set-up",
    ]);
  });
});
