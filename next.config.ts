import type { NextConfig } from 'next';

const config: NextConfig = {
  poweredByHeader: false,
  reactCompiler: true,
  typedRoutes: true,
  // Piscina starts its worker from its own folder, so it must stay a package and not become part of a bundle.
  serverExternalPackages: ['piscina'],
  // Types are checked by `npm run types`, the engine's under its own rules; a second time here would only cost time.
  typescript: { ignoreBuildErrors: true },
  // Nothing here is resized on the server, so the address that would do it stays closed.
  images: { unoptimized: true },
  // Answers to /api carry their own error bodies; a redirect for a trailing slash would lose a POST's body.
  skipTrailingSlashRedirect: true,
};

export default config;
