/** Lets the browser keep a file that is in memory, where it keeps downloads. */
export const saveAs = (name: string, blob: Blob): void => {
  const url = URL.createObjectURL(blob);
  const link = document.createElement('a');
  link.href = url;
  link.download = name;
  link.click();
  // the download has begun by then; until then the address must live
  setTimeout(() => URL.revokeObjectURL(url), 60_000);
};
