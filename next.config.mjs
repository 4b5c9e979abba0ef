/** @type {import("next").NextConfig} */
const config = {
  distDir: process.env.NEAP_DIST_DIR || ".next",
  poweredByHeader: false,
  reactStrictMode: true,
  headers: async () => [
    {
      source: "/:path*",
      headers: [
        { key: "x-content-type-options", value: "nosniff" },
        { key: "x-frame-options", value: "DENY" },
        { key: "referrer-policy", value: "same-origin" },
      ],
    },
  ],
  serverExternalPackages: ["@node-rs/argon2", "pg", "@react-pdf/renderer"],
  experimental: {
    // Both limits are needed: with only the first, bodies are cut silently at 10 MB.
    serverActions: { bodySizeLimit: "64mb" },
    proxyClientMaxBodySize: "64mb",
  },
};

export default config;
