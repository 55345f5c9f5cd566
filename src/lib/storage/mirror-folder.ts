/** A folder of this computer that a person has chosen, as far as a copy needs it. */
export interface MirrorFolder {
  readonly name: string;
  /** Whether it may be written; `ask` puts the question to the person, and needs a tap. */
  permitted(ask: boolean): Promise<boolean>;
  /** null: there is no such file. */
  read(name: string): Promise<Uint8Array | null>;
  /** The file stands as it was until the new one is whole. */
  write(name: string, bytes: Uint8Array): Promise<void>;
}

/** What browsers with file handles offer beyond the standard's types. */
interface Permissions {
  queryPermission?: (options: { mode: 'readwrite' }) => Promise<PermissionState>;
  requestPermission?: (options: { mode: 'readwrite' }) => Promise<PermissionState>;
}

/** The adapter of a directory handle. Source: WICG File System Access; WHATWG File System (createWritable replaces on close). */
export function mirrorFolder(handle: FileSystemDirectoryHandle & Permissions): MirrorFolder {
  const mode = { mode: 'readwrite' } as const;
  return {
    name: handle.name,
    permitted: async (ask) => {
      const now = (await handle.queryPermission?.(mode)) ?? 'granted';
      if (now === 'granted' || !ask) return now === 'granted';
      return (await handle.requestPermission?.(mode)) === 'granted';
    },
    read: async (name) => {
      try {
        const file = await (await handle.getFileHandle(name)).getFile();
        return new Uint8Array(await file.arrayBuffer());
      } catch (cause) {
        if (cause instanceof DOMException && cause.name === 'NotFoundError') return null;
        throw cause;
      }
    },
    write: async (name, bytes) => {
      const stream = await (await handle.getFileHandle(name, { create: true })).createWritable();
      try {
        await stream.write(bytes.slice());
      } catch (cause) {
        await stream.abort().catch(() => undefined);
        throw cause;
      }
      await stream.close();
    }
  };
}
