import { exportOperation } from "@/lib/cables/exchange/operations";
import { exportCatalogue } from "@/lib/cables/export/service";
import { textDownload } from "@/lib/http/download";
import { handle, route } from "@/lib/http/handle";

export const { GET, POST, PUT, PATCH, DELETE, OPTIONS } = route({
  GET: handle(exportOperation, ({ actor, query }) => {
    const name = `catalogue-${new Date().toISOString().slice(0, 10)}.${query.format}`;
    const mediaType = query.format === "csv" ? "text/csv" : "application/json";
    return textDownload(exportCatalogue(actor, query), mediaType, name);
  }),
});
