/** Shown with every result. */
export const CAUTIONS: readonly string[] = [
  'Results support trained staff and do not replace an accredited procedure.',
  "Not for diagnosis, treatment or the release of food or medicine without the laboratory's own validated method and the local rules.",
  'An interval covers only the model and the inputs it names.',
];
