import { request } from "node:http";

export interface RawReply {
  status: number;
  headers: Record<string, string | string[] | undefined>;
  text: string;
}

/** A request exactly as said: any method, any Host header, an address that no URL parser has touched. */
export function rawRequest(
  url: string,
  options: { method?: string; path: string; headers?: Record<string, string>; body?: string },
): Promise<RawReply> {
  const { hostname, port } = new URL(url);
  return new Promise((resolve, reject) => {
    const { method = "GET", path, headers, body } = options;
    const call = request({ hostname, port, method, path, headers, agent: false }, (response) => {
      let text = "";
      response.setEncoding("utf8");
      response.on("data", (chunk: string) => (text += chunk));
      response.on("error", reject);
      response.on("end", () =>
        resolve({ status: response.statusCode ?? 0, headers: response.headers, text }),
      );
    });
    call.on("error", reject);
    call.end(body);
  });
}
