/** @type {import('next').NextConfig} */
export default {
  typedRoutes: true,
  reactCompiler: true,
  poweredByHeader: false,
  agentRules: false,
  serverExternalPackages: ['@libsql/client', 'libsql', '@node-rs/argon2'],
  experimental: { authInterrupts: true },
};
