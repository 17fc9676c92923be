import type { Setting } from './setting.ts';

export type IntegerSettingOptions = {
  readonly key: string;
  readonly default?: number;
  readonly min: number;
  readonly max: number;
};

/** A whole number from `min` to `max`, in decimal digits. */
export function integerSetting({ key, default: fallback, min, max }: IntegerSettingOptions): Setting<number> {
  return {
    key,
    default: fallback,
    isRequired: fallback === undefined,
    isSecret: false,
    expected: `a whole number from ${min} to ${max}`,
    read: (text) => {
      const value = /^[+-]?\d+$/.test(text) ? Number(text) : Number.NaN;
      return value >= min && value <= max ? value : undefined;
    },
  };
}
