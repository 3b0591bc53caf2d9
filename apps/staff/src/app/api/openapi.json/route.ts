import { openApiDocument } from "@/server/openapi/openapi-document";

let made: string | undefined;

/** The document of the whole API. It says nothing about any practice, so it asks for no session. */
export function GET() {
  made ??= JSON.stringify(openApiDocument());
  return new Response(made, { headers: { "content-type": "application/json; charset=utf-8" } });
}
