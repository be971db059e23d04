"use client";

import { useEffect, useState, useSyncExternalStore } from "react";
import { sendJson, useApi } from "@/app/_hooks/use-api";
import type { TallyReply } from "@/lib/schemas/tally";
import type { WardReturnReply } from "@/lib/schemas/ward-return";
import { EntryStore } from "./entry-store";

export function returnUrl({ ward, month }: Pick<WardReturnReply, "ward" | "month">): string {
  return `/api/returns/${encodeURIComponent(ward)}/${month}`;
}

/** The state of an open return's page, saved box by box and refreshed when somebody comes back to it. */
export function useEntry(initial: WardReturnReply) {
  const url = returnUrl(initial);
  const [store] = useState(
    () =>
      new EntryStore(initial, (indicator, body) =>
        sendJson<TallyReply>("PUT", `${url}/tallies/${encodeURIComponent(indicator)}`, body),
      ),
  );
  const state = useSyncExternalStore(store.subscribe, store.snapshot, store.snapshot);
  useApi<WardReturnReply>(url, {
    fallbackData: initial,
    revalidateOnMount: false,
    onSuccess: (fresh) => store.receive(fresh),
  });

  useEffect(() => {
    const again = () => store.saveAgain();
    window.addEventListener("online", again);
    return () => window.removeEventListener("online", again);
  }, [store]);

  const isUnsaved = Object.keys(state.drafts).length > 0;
  useEffect(() => {
    if (!isUnsaved) return;
    const warn = (event: BeforeUnloadEvent) => event.preventDefault();
    window.addEventListener("beforeunload", warn);
    return () => window.removeEventListener("beforeunload", warn);
  }, [isUnsaved]);

  return { store, state };
}
