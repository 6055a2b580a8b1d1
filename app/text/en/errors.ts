/** Words when a page cannot be shown: what happened, what to do next. */
export const errorText = {
  product: "Keypeg",
  home: "To your start page",
  403: {
    title: "This part is not yours to open",
    next: "Ask a manager of your firm if you need it.",
  },
  404: {
    title: "There is nothing at this address",
    next: "Check the unit number or the link, or go back to your start page.",
  },
  other: {
    title: "Something went wrong here",
    next: "Nothing you sent is lost by this page. Try again in a moment.",
  },
} as const;
