import type { Setting } from './setting.ts';

export type ChoiceSettingOptions<Choice extends string> = {
  readonly key: string;
  readonly choices: readonly Choice[];
  readonly default?: NoInfer<Choice>;
};

/** One word of several. */
export function choiceSetting<const Choice extends string>(options: ChoiceSettingOptions<Choice>): Setting<Choice> {
  const { key, choices, default: fallback } = options;
  return {
    key,
    default: fallback,
    isRequired: fallback === undefined,
    isSecret: false,
    expected: `one of ${choices.join(', ')}`,
    read: (text) => choices.find((choice) => choice === text),
  };
}
