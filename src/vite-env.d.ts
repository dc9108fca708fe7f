/// <reference types="vite/client" />

/** Address of the findings worker's script; see vite.config.ts. */
declare module 'virtual:findings-worker' {
  const address: string;
  export default address;
}
