/** What a page says when a request brought no usable answer. */
export const sendingWords = {
  noConnection: "There is no connection to Ebbline. Nothing was changed. Try again when it's back.",
  noConnectionTitle: "No connection",
  unreadable: "The answer can't be read. Load the page again to see what was kept.",
  unreadableTitle: "Something went wrong",
} as const;
