/** Set by the proxy on every page request, over whatever was sent: the path that was asked for. */
export const PATH_HEADER = "x-ebbline-path";
