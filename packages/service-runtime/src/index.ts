export { type ChoiceSettingOptions, choiceSetting } from './choice-setting.ts';
export {
  createLogger,
  type Logger,
  type LoggerOptions,
  type LogLevel,
  logLevels,
  withoutSecrets,
} from './create-logger.ts';
export { type IntegerSettingOptions, integerSetting } from './integer-setting.ts';
export { ConfigurationError, knownKeys, parseConfiguration } from './parse-configuration.ts';
export type { Configuration, ConfigurationShape, Setting } from './setting.ts';
export { type ShutdownOptions, type SupervisedProcess, superviseShutdown } from './supervise-shutdown.ts';
export { optionalTextSetting, type TextSettingOptions, textSetting } from './text-setting.ts';
