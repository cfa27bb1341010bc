import * as z from 'zod';

const schema = z.object({
  NODE_ENV: z.enum(['development', 'production', 'test']).default('development'),
  PORT: z.coerce.number().int().min(1).max(65535).default(4310),
  BASE_URL: z.url().optional(),
  DATABASE_URL: z.string().min(1),
  SESSION_SECRET: z.string().min(32),
  SMTP_URL: z.string().min(1),
  MAIL_FROM: z.string().min(3).default('Vatwright <no-reply@vatwright.example>'),
  S3_ENDPOINT: z.url().optional(),
  S3_BUCKET: z.string().min(1),
  S3_REGION: z.string().min(1).default('us-east-1'),
  S3_ACCESS_KEY_ID: z.string().min(1),
  S3_SECRET_ACCESS_KEY: z.string().min(1),
  LOG_LEVEL: z.enum(['fatal', 'error', 'warn', 'info', 'debug', 'silent']).default('info'),
  TRUST_PROXY_HOPS: z.coerce.number().int().min(0).max(5).default(0),
});

export type Config = Omit<z.output<typeof schema>, 'BASE_URL'> & {
  /** Where people reach the product; links in mail start here. */
  readonly BASE_URL: string;
  /** Secure cookies need https; plain http is for loopback only. */
  readonly secure: boolean;
};

/**
 * Reads the settings from the environment.
 * @throws Error that names every setting at fault at once.
 */
export function readConfig(env: NodeJS.ProcessEnv): Config {
  const read = schema.safeParse(env);
  if (!read.success) {
    const faults = read.error.issues.map(({ path, message }) => `  ${path.join('.')}: ${message}`);
    throw new Error(`Settings that cannot be used:\n${faults.join('\n')}`);
  }
  const baseUrl = read.data.BASE_URL ?? `http://localhost:${read.data.PORT}`;
  return { ...read.data, BASE_URL: baseUrl, secure: baseUrl.startsWith('https:') };
}
