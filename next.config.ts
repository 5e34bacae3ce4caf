import type { NextConfig } from 'next';

const config: NextConfig = {
  poweredByHeader: false,
  reactCompiler: true,
  typedRoutes: true,
};

export default config;
