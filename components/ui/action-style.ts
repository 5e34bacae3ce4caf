export type ActionVariant = 'text' | 'primary' | 'outline';

const SHARED =
  'inline-flex min-h-6 items-center gap-2 text-left font-semibold disabled:text-soft disabled:no-underline aria-disabled:text-soft';

const VARIANTS: Record<ActionVariant, string> = {
  text: 'text-act underline-offset-4 hover:underline',
  primary:
    'min-h-9 border border-act bg-act px-4 text-ground hover:bg-transparent hover:text-act disabled:border-field disabled:bg-transparent aria-disabled:border-field aria-disabled:bg-transparent aria-disabled:hover:text-soft',
  outline:
    'min-h-9 border border-field px-4 text-act hover:border-ink disabled:hover:border-field aria-disabled:hover:border-field',
};

/** Classes of what can be acted on, whether a button or a link: coloured words, a frame, or the page's one main action. */
export function actionStyle(variant: ActionVariant = 'text', className = ''): string {
  return `${SHARED} ${VARIANTS[variant]} ${className}`;
}
