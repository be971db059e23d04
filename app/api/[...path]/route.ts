import { DomainError } from "@/lib/errors";
import { route } from "@/lib/http";

/** Addresses under /api that no other file answers: said as every error is, not as a page. */
const unknown = route({
  summary: "Nothing is here",
  openToAnyone: true,
  run: () => Promise.reject(new DomainError("not-found", "There is no such address.")),
});

export { unknown as DELETE, unknown as GET, unknown as PATCH, unknown as POST, unknown as PUT };
