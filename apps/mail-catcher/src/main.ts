import { startMailCatcher } from './catcher.js';

const port = (name: string): number => {
  const value = Number(process.env[name] ?? '0');
  if (Number.isInteger(value) && value >= 0 && value < 65_536) return value;
  throw new Error(`${name} is not a port: give a number from 0 to 65535.`);
};

try {
  const catcher = await startMailCatcher({
    smtpPort: port('SMTP_PORT'),
    httpPort: port('HTTP_PORT'),
    mailDir: process.env['MAIL_DIR'] || undefined,
  });
  console.log(JSON.stringify({ smtpPort: catcher.smtpPort, httpPort: catcher.httpPort }));
  const stop = () => void catcher.close().then(() => process.exit(0));
  process.once('SIGTERM', stop);
  process.once('SIGINT', stop);
} catch (error) {
  console.error(`The mail catcher cannot start: ${error instanceof Error ? error.message : String(error)}`);
  process.exitCode = 1;
}
