"use client";
import { QueryClient, QueryClientProvider } from "@tanstack/react-query";
import { ChangesProvider } from "@withy/ui/recent-changes";
import { type ReactNode, useState } from "react";
import { ApiError } from "@/api/request";
import { PersonId } from "./person-id";
import { ShortcutProvider } from "./shortcuts/shortcut-provider";

/** What every signed-in screen stands in: server state, recent changes, shortcuts. */
export function Providers({ personId, children }: { personId: string; children: ReactNode }) {
  const [client] = useState(
    () =>
      new QueryClient({
        defaultOptions: {
          queries: {
            staleTime: 10_000,
            refetchOnWindowFocus: true,
            retry: (failures, error) => !(error instanceof ApiError && error.status < 500) && failures < 2,
          },
          mutations: { retry: false },
        },
      }),
  );
  return (
    <PersonId id={personId}>
      <QueryClientProvider client={client}>
        <ChangesProvider>
          <ShortcutProvider>{children}</ShortcutProvider>
        </ChangesProvider>
      </QueryClientProvider>
    </PersonId>
  );
}
