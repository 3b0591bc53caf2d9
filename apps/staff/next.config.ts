import type { NextConfig } from "next";

const config: NextConfig = {
  typedRoutes: false,
  poweredByHeader: false,
  reactStrictMode: true,
  images: { unoptimized: true },
  serverExternalPackages: [
    "pdfkit",
    "mysql2",
    "@node-rs/argon2",
    "rate-limiter-flexible",
    "pino",
    "nodemailer",
  ],
  devIndicators: false,
  async headers() {
    return [
      {
        source: "/:path*",
        headers: [
          { key: "X-Content-Type-Options", value: "nosniff" },
          { key: "Referrer-Policy", value: "same-origin" },
          { key: "X-Frame-Options", value: "SAMEORIGIN" },
          { key: "Permissions-Policy", value: "camera=(), microphone=(), geolocation=(), payment=()" },
          { key: "Cross-Origin-Opener-Policy", value: "same-origin" },
          { key: "Strict-Transport-Security", value: "max-age=31536000" },
        ],
      },
      // Records must never lie in a shared browser's cache. A calendar program keeps its feed, so that one says
      // for itself how it may be kept.
      { source: "/api/:path((?!feeds/).*)", headers: [{ key: "Cache-Control", value: "no-store" }] },
    ];
  },
};

export default config;
