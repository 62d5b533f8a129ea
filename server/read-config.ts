import { ConfigError, loadConfig, readEnvFile, type Config } from './config';

/** The settings of this process; faults in them are told in plain words and end it. */
export function readConfig(): Config {
  try {
    readEnvFile();
    return loadConfig(process.env);
  } catch (error) {
    if (!(error instanceof ConfigError)) throw error;
    process.stderr.write(`${error.message}\n`);
    process.exit(1);
  }
}
