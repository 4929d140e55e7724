import { STORAGE_ACCOUNT, STORAGE_SECRET, STORAGE_USER } from './swift-config.mjs';

/** @param {number} port */
export const webOrigins = (port) => [`http://127.0.0.1:${port}`, `http://localhost:${port}`];

/** @param {import('./ports.mjs').Ports} ports */
function databaseUrls(ports) {
  const url = (/** @type {string} */ role) => `postgres://${role}@127.0.0.1:${ports.postgres}/fourfold`;
  return {
    DATABASE_URL: url('fourfold_app'),
    MIGRATION_DATABASE_URL: url('fourfold_owner'),
    MAINTENANCE_DATABASE_URL: url('fourfold_maintenance'),
  };
}

/**
 * What web, worker and commands are told. Settings about the product itself may be given from outside; where the local
 * services listen may not.
 * @param {import('./ports.mjs').Ports} ports @param {Record<string, string | undefined>} outside
 * @returns {Record<string, string>}
 */
export function productEnvironment(ports, outside) {
  const storage = `http://127.0.0.1:${ports.storage}`;
  return {
    FOURFOLD_MODE: outside.FOURFOLD_MODE ?? 'demo',
    PUBLIC_URL: outside.PUBLIC_URL ?? `http://127.0.0.1:${ports.web}`,
    DEMO_PASSWORD: outside.DEMO_PASSWORD ?? 'fourfold-demo',
    LOG_LEVEL: outside.LOG_LEVEL ?? 'info',
    TRUSTED_PROXIES: outside.TRUSTED_PROXIES ?? '',
    STORAGE_QUOTA_BYTES: outside.STORAGE_QUOTA_BYTES ?? '',
    PART_ADDRESS_SECONDS: outside.PART_ADDRESS_SECONDS ?? '',
    ...databaseUrls(ports),
    REDIS_URL: `redis://127.0.0.1:${ports.redis}`,
    STORAGE_ENDPOINT: storage,
    STORAGE_PUBLIC_URL: outside.STORAGE_PUBLIC_URL ?? storage,
    STORAGE_BUCKET: 'fourfold',
    STORAGE_REGION: 'us-east-1',
    STORAGE_ACCESS_KEY: `${STORAGE_ACCOUNT}:${STORAGE_USER}`,
    STORAGE_SECRET_KEY: STORAGE_SECRET,
    // The SDK's note that it will want a newer Node one day would open every log.
    AWS_SDK_JS_NODE_VERSION_SUPPORT_WARNING_DISABLED: 'true',
    METRICS_PORT: String(ports.metrics),
    SMTP_URL: `smtp://127.0.0.1:${ports.smtp}`,
    MAIL_FROM: outside.MAIL_FROM ?? 'Fourfold <fourfold@northmoor.example>',
  };
}

/** What the tests are told besides. @param {import('./ports.mjs').Ports} ports @returns {Record<string, string>} */
export function testEnvironment(ports) {
  return {
    WEB_URL: `http://127.0.0.1:${ports.web}`,
    INBOX_URL: `http://127.0.0.1:${ports.inbox}`,
    TEST_ADMIN_DATABASE_URL: `postgres://postgres@127.0.0.1:${ports.postgres}/fourfold`,
  };
}
