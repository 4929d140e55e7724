/** @type {import('next').NextConfig} */
const config = {
  output: 'standalone',
  outputFileTracingRoot: import.meta.dirname,
  serverExternalPackages: ['@node-rs/argon2', 'pg', 'bullmq', 'ioredis', 'mathjs', 'pino'],
  poweredByHeader: false,
  reactStrictMode: true,
  // Types are validated apart; the build would check the tests' too, and keep everybody who starts it waiting.
  typescript: { ignoreBuildErrors: true },
  devIndicators: false,
  // Browsers ask for this name where a page names no icon, as on a page that is not there.
  rewrites: () => [{ source: '/favicon.ico', destination: '/icon.svg' }],
};

export default config;
