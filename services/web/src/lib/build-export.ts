/** Asking for an export to be built: from an approved request, and again from the list of exports. */
import { buildExport } from '@cairnstep/contract';
import { useMutation, useQueryClient } from '@tanstack/react-query';
import { call } from './call.ts';

export const exportsKey = ['exports'] as const;

export function useBuildExport() {
  const cache = useQueryClient();
  return useMutation({
    mutationFn: (requestId: string) => call(buildExport, { requestId }),
    onSuccess: () => cache.invalidateQueries({ queryKey: exportsKey }),
  });
}
