import tailwindcss from '@tailwindcss/vite';
import react from '@vitejs/plugin-react';
import { defineConfig } from 'vite';

export default defineConfig({
  root: 'client',
  plugins: [react(), tailwindcss()],
  build: {
    outDir: '../dist/client',
    emptyOutDir: true,
    manifest: true,
    modulePreload: { polyfill: false },
    // A font inside the style sheet would need data: in the content security policy.
    assetsInlineLimit: 0,
  },
  server: { strictPort: true },
});
