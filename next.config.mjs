/** @type {import('next').NextConfig} */
const nextConfig = {
  reactStrictMode: true,
  poweredByHeader: false,
  agentRules: false,
  // The browser suite builds into its own folder, so that it never touches a running server's build.
  distDir: process.env.EVENRUN_DIST ?? '.next',
  serverExternalPackages: [
    '@mikro-orm/postgresql',
    '@mikro-orm/migrations',
    '@mikro-orm/seeder',
    'pdfkit',
  ],
  experimental: {
    agentUpgrade: false,
    authInterrupts: true,
    serverActions: { bodySizeLimit: '64mb' },
    proxyClientMaxBodySize: '64mb',
  },
};

export default nextConfig;
