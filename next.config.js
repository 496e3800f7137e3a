import { dirname } from 'node:path'
import { fileURLToPath } from 'node:url'

const projectFolder = dirname(fileURLToPath(import.meta.url))

/** @type {import('next').NextConfig} */
const nextConfig = {
  // Tests build into a folder of their own so that they never break a running start.
  distDir: process.env.NEXT_DIST_DIR ?? '.next',
  // A build looks at what it is made from, not at the tests. Next writes build folders into the tsconfig.json it is given,
  // but leaves one alone that extends another.
  typescript: { tsconfigPath: 'tsconfig.build.json' },
  reactStrictMode: true,
  poweredByHeader: false,
  // Knex looks its dialects up at run time and pino starts its transports as threads: neither survives bundling.
  serverExternalPackages: ['knex', 'pino', 'pg-boss'],
  // Whatever is answered is what it says it is: pages, redirects, files and all.
  headers: async () => [
    { source: '/:path*', headers: [{ key: 'x-content-type-options', value: 'nosniff' }] },
  ],
  allowedDevOrigins: ['127.0.0.1'],
  turbopack: { root: projectFolder },
  outputFileTracingRoot: projectFolder,
}

export default nextConfig
