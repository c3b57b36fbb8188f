import react from '@vitejs/plugin-react';
import { fileURLToPath } from 'node:url';
import { defineConfig } from 'vite';

const here = (path: string) => fileURLToPath(new URL(path, import.meta.url));

export default defineConfig({
  plugins: [react()],
  resolve: {
    alias: [
      // the API's pure functions and vocabulary; Vite finds the .ts file behind a .js name only for relative imports
      { find: /^@kerfside\/calc\/(.+?)(?:\.js)?$/, replacement: `${here('../conference-api/src/calc')}/$1.ts` },
      { find: /^@\/(.+)$/, replacement: `${here('./src')}/$1` },
    ],
  },
  build: { manifest: true, target: 'es2022', reportCompressedSize: false },
  server: {
    proxy: { '/api': { target: process.env.KERFSIDE_API_URL ?? 'http://127.0.0.1:4300' } },
  },
});
