/** The registry's background work. Payloads hold ids, nothing else. */
export const queues = ['check-submission', 'send-mail', 'build-export', 'tidy-up', 'remind-coordinators'] as const;
export type QueueName = (typeof queues)[number];

export interface Payloads {
  'check-submission': { readonly submissionId: string };
  'send-mail': { readonly mailId: string };
  'build-export': { readonly exportId: string };
  'tidy-up': Record<string, never>;
  'remind-coordinators': Record<string, never>;
}

/** Retries with doubling pauses; a crashed worker's job is taken up again after `expireInMinutes`. */
export const queueOptions: Readonly<
  Record<QueueName, { retryLimit: number; retryDelay: number; retryBackoff: boolean; expireInMinutes: number }>
> = {
  'check-submission': { retryLimit: 3, retryDelay: 2, retryBackoff: true, expireInMinutes: 2 },
  'send-mail': { retryLimit: 8, retryDelay: 5, retryBackoff: true, expireInMinutes: 1 },
  'build-export': { retryLimit: 3, retryDelay: 2, retryBackoff: true, expireInMinutes: 5 },
  'tidy-up': { retryLimit: 1, retryDelay: 30, retryBackoff: true, expireInMinutes: 5 },
  'remind-coordinators': { retryLimit: 3, retryDelay: 60, retryBackoff: true, expireInMinutes: 5 },
};
