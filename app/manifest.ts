import type { MetadataRoute } from 'next';

export default function manifest(): MetadataRoute.Manifest {
  return {
    id: '/bench',
    name: 'Holdfast',
    short_name: 'Holdfast',
    description: 'From a plan and a pile of wood to a finished, square, safe piece, with or without a signal.',
    start_url: '/bench',
    scope: '/',
    display: 'standalone',
    orientation: 'any',
    background_color: '#f7f4ec',
    theme_color: '#f7f4ec',
    icons: [
      { src: '/icon-192.png', sizes: '192x192', type: 'image/png' },
      { src: '/icon-512.png', sizes: '512x512', type: 'image/png' },
      { src: '/icon-maskable-512.png', sizes: '512x512', type: 'image/png', purpose: 'maskable' },
    ],
  };
}
