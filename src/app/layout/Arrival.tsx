import { useEffect, useState } from 'react';

/** Reads the title of each screen out when it is reached; silent to the eye. */
export function Arrival() {
  const [title, setTitle] = useState('');
  useEffect(() => {
    const onTitle = (event: Event) => {
      if (event instanceof CustomEvent && typeof event.detail === 'string') setTitle(event.detail);
    };
    window.addEventListener('graticule:title', onTitle);
    return () => window.removeEventListener('graticule:title', onTitle);
  }, []);
  return (
    <p aria-live="polite" className="sr-only">
      {title}
    </p>
  );
}
