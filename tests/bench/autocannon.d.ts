/** The parts used here of a package that ships without types. */
declare module 'autocannon' {
  interface Request {
    method?: string;
    path?: string;
    body?: string;
    headers?: Record<string, string>;
  }
  interface Options {
    url: string;
    connections: number;
    duration: number;
    requests: (Request & { setupRequest?: (request: Request) => Request })[];
  }
  interface Result {
    /** Seconds. */
    duration: number;
    requests: { total: number };
    non2xx: number;
    errors: number;
    timeouts: number;
  }
  export default function autocannon(options: Options): Promise<Result>;
}
