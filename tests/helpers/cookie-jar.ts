/** Stands for next/headers in tests: one browser's cookies. */
export const jar = new Map<string, string>();

export const headersModule = {
  cookies: () =>
    Promise.resolve({
      get: (name: string) => (jar.has(name) ? { name, value: jar.get(name) } : undefined),
      set: (name: string, value: string, attributes: { maxAge?: number } = {}) => {
        if (attributes.maxAge === 0) jar.delete(name);
        else jar.set(name, value);
      },
    }),
};
