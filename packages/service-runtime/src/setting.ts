/** One setting, read from one environment variable. */
export type Setting<T> = {
  readonly key: string;
  /** Taken when the variable is absent or empty. Without one the setting must be given. */
  readonly default: T | undefined;
  readonly isRequired: boolean;
  /** Its text is never repeated in a message. */
  readonly isSecret: boolean;
  /** What is expected, in words that complete "expected ...". */
  readonly expected: string;
  /** undefined when the text is not what is expected. */
  read(text: string): T | undefined;
};

/** What a service asks for: a name in the code for each setting. */
export type ConfigurationShape = Readonly<Record<string, Setting<unknown>>>;

/** What it gets. */
export type Configuration<Shape extends ConfigurationShape> = {
  readonly [Name in keyof Shape]: Shape[Name] extends Setting<infer T> ? T : never;
};
