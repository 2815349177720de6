import { useCallback, useEffect, useRef, useState } from 'react';

/** Addresses of the chosen pictures in this browser's own memory, by name, so that the contact sheet waits for no one. */
export function useLocalPictures() {
  const [addresses, setAddresses] = useState<ReadonlyMap<string, string>>(new Map());
  const latest = useRef(addresses);

  useEffect(() => {
    latest.current = addresses;
  }, [addresses]);
  useEffect(() => () => latest.current.forEach((address) => URL.revokeObjectURL(address)), []);

  const keep = useCallback((files: File[]) => {
    const made = files.map((file) => [file.name, URL.createObjectURL(file)] as const);
    setAddresses((have) => new Map([...have, ...made]));
  }, []);
  return { addresses, keep };
}
