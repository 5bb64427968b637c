import { useSyncExternalStore } from 'react';

const subscribe = (changed: () => void) => {
  window.addEventListener('online', changed);
  window.addEventListener('offline', changed);
  return () => {
    window.removeEventListener('online', changed);
    window.removeEventListener('offline', changed);
  };
};

/** Says that the device has no network, and that what is done now is kept. */
export function ConnectionBar() {
  const online = useSyncExternalStore(subscribe, () => navigator.onLine);
  return (
    <div role="status">
      {!online && (
        <p className="bg-ochre-pale px-4 py-1.5 text-note text-ochre tablet:px-12">
          No connection. What you see may be old; marks and clips wait on this device and go on by
          themselves.
        </p>
      )}
    </div>
  );
}
