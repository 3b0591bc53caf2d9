import { renderHandout } from "@withy/services/clinical";
import { route } from "@/server/run-route";

export const GET = route(renderHandout, {
  respond: ({ bytes, fileName }) =>
    new Response(new Uint8Array(bytes), {
      headers: {
        "content-type": "application/pdf",
        "content-disposition": `inline; filename="${fileName}"`,
        "cache-control": "private, no-store",
      },
    }),
});
