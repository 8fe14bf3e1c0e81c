/** Looks of a link that acts: the same as a button's, for navigation. */
export const linkLook = {
  plate:
    'font-figures flex min-h-20 w-full items-center justify-center rounded-plate bg-blue px-4 py-3 text-[28px] font-semibold text-on-blue active:brightness-90',
  act: 'font-figures inline-flex min-h-[52px] items-center rounded-plate border-2 border-iron bg-paper px-5 py-2 text-lg font-semibold text-iron active:bg-line',
  quiet: 'font-figures inline-flex min-h-11 items-center text-lg font-medium text-blue underline underline-offset-4',
} as const;
