/** Headers that fit every reply. Pages get their content policy, with a nonce, from proxy.ts. */
const everywhere = [
  { key: "X-Content-Type-Options", value: "nosniff" },
  { key: "Referrer-Policy", value: "same-origin" },
  { key: "Permissions-Policy", value: "camera=(), geolocation=(), microphone=(), payment=(), usb=()" },
  { key: "Cross-Origin-Opener-Policy", value: "same-origin" },
  { key: "Cross-Origin-Resource-Policy", value: "same-origin" },
  { key: "X-Frame-Options", value: "DENY" },
];

/** For replies that are no documents: shown by themselves they may load and run nothing. */
const nothingInside = {
  key: "Content-Security-Policy",
  value: "default-src 'none'; base-uri 'none'; form-action 'none'; frame-ancestors 'none'",
};

/** @type {import("next").NextConfig} */
const config = {
  poweredByHeader: false,
  images: { unoptimized: true },
  serverExternalPackages: ["@electric-sql/pglite", "pg", "exceljs"],
  experimental: { authInterrupts: true },
  headers: async () => [
    { source: "/:path*", headers: everywhere },
    { source: "/api/:path*", headers: [nothingInside, { key: "Cache-Control", value: "no-store" }] },
    { source: "/_next/:path*", headers: [nothingInside] },
    // The same files that proxy.ts leaves out.
    { source: "/:file([a-z-]+).svg", headers: [nothingInside] },
  ],
};

export default config;
