'use client';
import { useEffect } from 'react';
import type { DeviceSettings } from '@/lib/store/device-database';

/** Day, dim or as the phone says, and how large text is; set on the page's root, so that every view follows. */
export function useAppearance({ theme, textScale }: Pick<DeviceSettings, 'theme' | 'textScale'>): void {
  useEffect(() => {
    const root = document.documentElement;
    if (theme === 'phone') delete root.dataset.theme;
    else root.dataset.theme = theme;
    root.style.setProperty('--text-scale', String(textScale));
  }, [theme, textScale]);
}
