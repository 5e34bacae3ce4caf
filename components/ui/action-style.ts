export type ActionVariant = 'text' | 'primary';

const SHARED =
  'inline-flex min-h-6 items-center gap-2 text-left font-semibold disabled:text-soft disabled:no-underline aria-disabled:text-soft';

const VARIANTS: Record<ActionVariant, string> = {
  text: 'text-act underline-offset-4 hover:underline',
  primary:
    'min-h-9 border border-act bg-act px-4 text-ground hover:bg-transparent hover:text-act disabled:border-field disabled:bg-transparent',
};

/** Classes of what can be acted on, whether a button or a link: coloured words, or the page's one main action. */
export function actionStyle(variant: ActionVariant = 'text', className = ''): string {
  return `${SHARED} ${VARIANTS[variant]} ${className}`;
}
