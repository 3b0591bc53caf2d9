import { renderInvoice } from "@withy/services/billing";
import { route } from "@/server/run-route";

export const GET = route(renderInvoice, {
  respond: ({ bytes, fileName }) =>
    new Response(new Uint8Array(bytes), {
      headers: {
        "content-type": "application/pdf",
        "content-disposition": `inline; filename="${fileName}"`,
        "cache-control": "private, no-store",
      },
    }),
});
