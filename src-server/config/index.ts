import { z } from 'zod';

const environment = z.object({
  NODE_ENV: z.enum(['development', 'test', 'production']).default('development'),
  PORT: z.coerce.number().int().min(0).max(65535).default(8417),
  HOST: z.string().default('127.0.0.1'),
  DATABASE_URL: z.string().min(1),
  SESSION_SECRET: z.string().min(16),
  /** Where people reach the product; in mails, and the origin that changes must come from. */
  PUBLIC_ORIGIN: z.url().optional(),
  SMTP_URL: z.string().optional(),
  MAIL_FROM: z.string().default('Wallflux <wallflux@localhost>'),
  WALLFLUX_SEED: z.enum(['demo', 'none']).default('none'),
  /** Folder of the built browser application. */
  WALLFLUX_APPLICATION: z.string().default('dist/spa'),
  LOG_LEVEL: z.string().default('info'),
});

export interface Config {
  production: boolean;
  port: number;
  host: string;
  databaseUrl: string;
  sessionSecret: string;
  publicOrigin: string;
  smtpUrl: string | undefined;
  mailFrom: string;
  seedDemo: boolean;
  applicationFolder: string;
  logLevel: string;
}

/** Reads the environment once; throws one sentence that names what is wrong in it. */
export function readConfig(variables: NodeJS.ProcessEnv): Config {
  const parsed = environment.safeParse(variables);
  if (!parsed.success) {
    const issues = parsed.error.issues.map((issue) => `${issue.path.join('.')}: ${issue.message}`);
    throw new Error(`The environment is not complete: ${issues.join('; ')}`);
  }
  const values = parsed.data;
  return {
    production: values.NODE_ENV === 'production',
    port: values.PORT,
    host: values.HOST,
    databaseUrl: values.DATABASE_URL,
    sessionSecret: values.SESSION_SECRET,
    publicOrigin: new URL(values.PUBLIC_ORIGIN ?? `http://localhost:${values.PORT}`).origin,
    smtpUrl: values.SMTP_URL,
    mailFrom: values.MAIL_FROM,
    seedDemo: values.WALLFLUX_SEED === 'demo',
    applicationFolder: values.WALLFLUX_APPLICATION,
    logLevel: values.LOG_LEVEL,
  };
}
