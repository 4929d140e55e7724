/** @type {import('next').NextConfig} */
const config = {
  output: 'standalone',
  outputFileTracingRoot: import.meta.dirname,
  serverExternalPackages: ['@node-rs/argon2', 'pg', 'bullmq', 'ioredis', 'mathjs', 'pino'],
  poweredByHeader: false,
  reactStrictMode: true,
  devIndicators: false,
};

export default config;
