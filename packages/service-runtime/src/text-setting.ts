import type { Setting } from './setting.ts';

export type TextSettingOptions = { readonly key: string; readonly default?: string; readonly isSecret?: boolean };

/** A text. Without a default it must be given and not be empty. */
export function textSetting({ key, default: fallback, isSecret = false }: TextSettingOptions): Setting<string> {
  return {
    key,
    default: fallback,
    isRequired: fallback === undefined,
    isSecret,
    expected: 'a text',
    read: (text) => text,
  };
}

/** A text that may be absent. */
export function optionalTextSetting({
  key,
  isSecret = false,
}: Omit<TextSettingOptions, 'default'>): Setting<string | undefined> {
  return { key, default: undefined, isRequired: false, isSecret, expected: 'a text', read: (text) => text };
}
