import { forPage, pageCtx } from "@/lib/auth";
import { requireAction, type Action } from "@/lib/policy";

export type PageCtx = Awaited<ReturnType<typeof pageCtx>>;

/** The ctx of a set-up page for whoever may attempt its action; everybody else gets the page that says no. */
export async function setUpCtx(action: Action): Promise<PageCtx> {
  const ctx = await pageCtx();
  await forPage(refuseOthers(ctx, action));
  return ctx;
}

async function refuseOthers(ctx: PageCtx, action: Action): Promise<void> {
  requireAction(ctx.actor, action);
}
