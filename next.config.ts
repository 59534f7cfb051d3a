import type { NextConfig } from "next";

const config: NextConfig = {
  poweredByHeader: false,
  devIndicators: false,
  // The checkout is the whole project, whatever lies in the folders above it.
  turbopack: { root: import.meta.dirname },
};

export default config;
