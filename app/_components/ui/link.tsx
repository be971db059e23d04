import NextLink from "next/link";
import type { ComponentProps } from "react";

/**
 * A link inside Ebbline that loads its page when it is followed. Pages are drawn for one person at one moment, so
 * fetching every page that a table links to would only keep the server busy.
 */
export function Link(props: ComponentProps<typeof NextLink>) {
  return <NextLink prefetch={false} {...props} />;
}
