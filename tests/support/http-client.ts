import { z } from "zod";

export const DEMO_PASSWORD = "ebbline-demo";
export const demoAccounts = {
  nurse: "nurse@harrowmere.example",
  nurse2: "nurse2@harrowmere.example",
  infection: "infection@harrowmere.example",
  board: "board@harrowmere.example",
  lead: "lead@harrowmere.example",
} as const;
export type DemoAccount = keyof typeof demoAccounts;

export interface Reply {
  status: number;
  headers: Headers;
  /** Parsed where it is JSON, text otherwise. */
  body: unknown;
}

/** Headers beside the usual ones; null leaves a usual one out. */
export type ExtraHeaders = Record<string, string | null>;

/** A browser's part of HTTP: keeps cookies, sends the page's origin. */
export class HttpClient {
  private readonly cookies = new Map<string, string>();

  /** `origin` is the address that people type, where it isn't the one that the server listens on. */
  constructor(
    readonly url: string,
    private readonly origin = url,
  ) {}

  async request(method: string, path: string, body?: unknown, headers: ExtraHeaders = {}): Promise<Reply> {
    const isForm = body instanceof FormData || body instanceof URLSearchParams;
    const all: ExtraHeaders = {
      origin: this.origin,
      cookie: this.cookieHeader(),
      ...(body === undefined || isForm ? {} : { "content-type": "application/json" }),
      ...headers,
    };
    const response = await fetch(this.url + path, {
      method,
      redirect: "manual",
      headers: Object.entries(all).filter((entry): entry is [string, string] => entry[1] !== null),
      body:
        body === undefined
          ? undefined
          : isForm
            ? body
            : typeof body === "string"
              ? body
              : JSON.stringify(body),
    });
    for (const line of response.headers.getSetCookie()) this.keep(line);
    const type = response.headers.get("content-type") ?? "";
    const text = await response.text();
    const parsed: unknown = type.includes("json") && text !== "" ? JSON.parse(text) : text;
    return { status: response.status, headers: response.headers, body: parsed };
  }

  get = (path: string, headers?: ExtraHeaders) => this.request("GET", path, undefined, headers);
  put = (path: string, body: unknown) => this.request("PUT", path, body);
  post = (path: string, body?: unknown) => this.request("POST", path, body ?? {});
  patch = (path: string, body: unknown) => this.request("PATCH", path, body);
  delete = (path: string) => this.request("DELETE", path);

  /** Bytes of a download. */
  async download(path: string): Promise<{ status: number; headers: Headers; bytes: Uint8Array }> {
    const response = await fetch(this.url + path, { headers: { cookie: this.cookieHeader() } });
    return {
      status: response.status,
      headers: response.headers,
      bytes: new Uint8Array(await response.arrayBuffer()),
    };
  }

  /** Uploads one file in the field `file`. */
  async upload(path: string, bytes: Uint8Array | string, fileName: string): Promise<Reply> {
    const form = new FormData();
    const part = typeof bytes === "string" ? bytes : new Uint8Array(bytes);
    form.set("file", new File([part], fileName));
    return this.request("POST", path, form);
  }

  async signIn(email: string, password: string): Promise<Reply> {
    const { csrfToken } = z.object({ csrfToken: z.string() }).parse((await this.get("/api/auth/csrf")).body);
    const form = new URLSearchParams({ email, password, csrfToken, json: "true" });
    return this.request("POST", "/api/auth/callback/credentials", form);
  }

  /** The session cookie as it stands, for tests that copy it. */
  cookieHeader(): string {
    return [...this.cookies].map(([name, value]) => `${name}=${value}`).join("; ");
  }

  private keep(line: string): void {
    const [pair = ""] = line.split(";");
    const at = pair.indexOf("=");
    const [name, value] = [pair.slice(0, at), pair.slice(at + 1)];
    if (value === "" || /max-age=0/i.test(line)) this.cookies.delete(name);
    else this.cookies.set(name, value);
  }
}

/** A client that is signed in with one of the demo's accounts. */
export async function signedIn(url: string, account: DemoAccount): Promise<HttpClient> {
  const client = new HttpClient(url);
  await client.signIn(demoAccounts[account], DEMO_PASSWORD);
  const me = await client.get("/api/me");
  if (me.status !== 200) throw new Error(`Signing in as ${account} failed: ${JSON.stringify(me.body)}`);
  return client;
}
