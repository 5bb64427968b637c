import { useEffect, useState } from 'react';
import type { LocalLook } from '#src/video/look-at-file.ts';
import { NoPicture } from './row-frame.tsx';

/** The first picture of a file on this device, where this browser can decode it. */
export function LocalPicture({ file, look }: { file: File | null; look: LocalLook | null }) {
  const [source, setSource] = useState<string | null>(null);
  const decodable = look?.outcome === 'clip' && look.decodableHere;
  useEffect(() => {
    if (file === null || !decodable) return;
    const url = URL.createObjectURL(file);
    // an outside resource that must be given back: it cannot be made while rendering
    // eslint-disable-next-line react-hooks/set-state-in-effect
    setSource(url);
    return () => URL.revokeObjectURL(url);
  }, [file, decodable]);
  if (source === null || !decodable) return <NoPicture />;
  return (
    <video
      // a moment in: the very first frame of a phone is often dark
      src={`${source}#t=0.2`}
      muted
      playsInline
      preload="metadata"
      aria-hidden="true"
      className="h-full w-full object-cover"
    />
  );
}
