import { Tabs as Primitive } from 'radix-ui';
import type { ReactNode } from 'react';

interface TabsProps<View extends string> {
  /** What the views have in common, for screen readers. */
  label: string;
  views: readonly { view: View; name: string }[];
  view: View;
  onView: (view: View) => void;
  /** The view on show. */
  children: ReactNode;
}

/** Words over a line, one view at a time; arrow keys go from word to word. */
export function Tabs<View extends string>({ label, views, view, onView, children }: TabsProps<View>) {
  const choose = (value: string) => {
    const chosen = views.find((each) => each.view === value);
    if (chosen !== undefined) onView(chosen.view);
  };
  return (
    <Primitive.Root value={view} onValueChange={choose}>
      <Primitive.List aria-label={label} className="mb-6 flex flex-wrap gap-x-6 border-b border-ink">
        {views.map((each) => (
          <Primitive.Trigger
            key={each.view}
            value={each.view}
            className="cursor-pointer border-b-[3px] border-transparent pb-1 text-muted hover:text-ink data-[state=active]:border-accent data-[state=active]:text-ink"
          >
            {each.name}
          </Primitive.Trigger>
        ))}
      </Primitive.List>
      <Primitive.Content value={view} className="grid grid-cols-[minmax(0,1fr)] gap-6">
        {children}
      </Primitive.Content>
    </Primitive.Root>
  );
}
