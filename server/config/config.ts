import os from 'node:os';
import path from 'node:path';
import { z } from 'zod';

const megabyte = 1024 * 1024;
const count = z.coerce.number().int().min(1);

/** The environment that the server reads, all of it. README.md lists these for the person who runs it. */
const environment = z.object({
  NODE_ENV: z.enum(['development', 'test', 'production']).default('development'),
  PORT: z.coerce.number().int().min(0).max(65_535).default(3000),
  HOST: z.string().default('127.0.0.1'),
  PUBLIC_URL: z.url().optional(),
  TRUST_PROXY: z.stringbool().default(false),
  DATA_DIR: z.string().default('./storage'),
  SEED: z.enum(['demo', 'none']).optional(),
  RECOGNITION_WORKERS: z.coerce.number().int().min(0).max(64).optional(),
  LOG_LEVEL: z.enum(['fatal', 'error', 'warn', 'info', 'debug', 'silent']).default('info'),
  MAX_UPLOAD_MB: count.default(1024),
  MAX_PAGES: count.default(2000),
  MAX_PICTURE_MEGAPIXELS: count.default(120),
  WORKER_MEMORY_MB: count.default(900),
  PAGE_TIMEOUT_SECONDS: count.default(180),
  REVISION_AFTER_QUIET_SECONDS: z.coerce.number().positive().default(60),
  SMTP_URL: z.string().optional(),
  MAIL_FROM: z.string().default('Benchleaf <no-reply@benchleaf.example>'),
  S3_BUCKET: z.string().optional(),
  S3_ENDPOINT: z.string().optional(),
  S3_REGION: z.string().default('us-east-1'),
});

export type Config = {
  production: boolean;
  port: number;
  host: string;
  publicUrl: string | null;
  trustProxy: boolean;
  dataDir: string;
  seed: 'demo' | 'none' | null;
  recognitionWorkers: number;
  logLevel: string;
  limits: {
    uploadBytes: number;
    pages: number;
    pictureMegapixels: number;
    workerMemoryBytes: number;
    pageTimeoutMs: number;
    /** What is written on a page becomes a revision once nobody has written for so long. */
    quietMs: number;
  };
  mail: { smtpUrl: string | null; from: string };
  s3: { bucket: string; endpoint: string | null; region: string } | null;
};

/** Reads the environment once. Throws with one line a fault when a value is not usable. */
export function readConfig(env: NodeJS.ProcessEnv): Config {
  const read = environment.safeParse(env);
  if (!read.success) {
    const faults = read.error.issues.map(({ path: at, message }) => `  ${at.join('.')}: ${message}`);
    throw new Error(`The configuration cannot be used:\n${faults.join('\n')}`);
  }
  const { data } = read;
  return {
    production: data.NODE_ENV === 'production',
    port: data.PORT,
    host: data.HOST,
    publicUrl: data.PUBLIC_URL ?? null,
    trustProxy: data.TRUST_PROXY,
    dataDir: path.resolve(data.DATA_DIR),
    seed: data.SEED ?? null,
    recognitionWorkers: data.RECOGNITION_WORKERS ?? Math.max(1, os.availableParallelism() - 1),
    logLevel: data.LOG_LEVEL,
    limits: {
      uploadBytes: data.MAX_UPLOAD_MB * megabyte,
      pages: data.MAX_PAGES,
      pictureMegapixels: data.MAX_PICTURE_MEGAPIXELS,
      workerMemoryBytes: data.WORKER_MEMORY_MB * megabyte,
      pageTimeoutMs: data.PAGE_TIMEOUT_SECONDS * 1000,
      quietMs: data.REVISION_AFTER_QUIET_SECONDS * 1000,
    },
    mail: { smtpUrl: data.SMTP_URL ?? null, from: data.MAIL_FROM },
    s3:
      data.S3_BUCKET === undefined
        ? null
        : { bucket: data.S3_BUCKET, endpoint: data.S3_ENDPOINT ?? null, region: data.S3_REGION },
  };
}
