/** What Ebbline is not for. The same text stands in the README, on packs and in workbooks. */
export const cautionWords = {
  title: "What to bear in mind",
  subtitle: "Before you act on anything that Ebbline shows.",
  lead: "A signal is a prompt to look, never proof of cause, fault or harm; no signal is no proof of safety.",
  urgent: "Raise urgent safety concerns the local way at once, without waiting for a chart.",
  countsOnlyTitle: "Counts only.",
  countsOnly: "Don’t put patient names, numbers or dates of birth anywhere in Ebbline, including notes.",
  points: [
    {
      title: "It decides nothing.",
      text:
        "Ebbline does not diagnose, does not replace incident reporting or clinical judgement, and never decides " +
        "about a patient.",
    },
    {
      title: "Local rules come first.",
      text: "Follow local clinical governance, infection-prevention policy and licensed practice.",
    },
    {
      title: "Small numbers tell little.",
      text:
        "A month with a small denominator may be unable to show even a large change. Ebbline says so where it is " +
        "the case. “No events counted” is not “no harm”.",
    },
    {
      title: "Some months stand out by chance.",
      text:
        "With hundreds of charts a few months lie outside their limits although nothing changed. Ebbline says how " +
        "many to expect.",
    },
    {
      title: "Wards aren’t ranked.",
      text:
        "Wards differ in what they do and for whom. A funnel plot is for asking questions about one ward’s own " +
        "record, not a verdict.",
    },
    {
      title: "No patient details.",
      text: "Enter nothing that could identify a patient: no names, numbers or dates of birth, in notes neither.",
    },
  ],
  link: "What to bear in mind",
} as const;
