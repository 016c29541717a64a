/** Sent with everything, files included; the content security policy is made per request in proxy.ts. */
const headers = {
  'X-Content-Type-Options': 'nosniff',
  'X-Frame-Options': 'DENY',
  'Referrer-Policy': 'same-origin',
  'Permissions-Policy':
    'camera=(), microphone=(), geolocation=(), payment=(), usb=(), serial=(), browsing-topics=()',
  'Cross-Origin-Opener-Policy': 'same-origin',
  'Cross-Origin-Resource-Policy': 'same-origin',
  'X-DNS-Prefetch-Control': 'off',
};

/** Uploads above this are cut off; those up to 10 MB reach the code that answers with a sentence. */
const bodySizeLimit = '12mb';

/** @type {import('next').NextConfig} */
export default {
  agentRules: false,
  reactCompiler: true,
  poweredByHeader: false,
  distDir: process.env.NEXT_DIST_DIR || '.next',
  typescript: process.env.NEXT_TSCONFIG ? { tsconfigPath: process.env.NEXT_TSCONFIG } : {},
  serverExternalPackages: [
    '@node-rs/argon2',
    'graphile-worker',
    'nodemailer',
    'pg',
    'pino',
    'postgres',
    'rate-limiter-flexible',
  ],
  experimental: {
    agentUpgrade: false,
    serverActions: {
      bodySizeLimit,
      allowedOrigins: process.env.APP_URL ? [new URL(process.env.APP_URL).host] : [],
    },
    proxyClientMaxBodySize: bodySizeLimit,
  },
  headers: async () => [
    { source: '/:path*', headers: Object.entries(headers).map(([key, value]) => ({ key, value })) },
  ],
};
