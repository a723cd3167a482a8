import { startMailSender } from '@/server/mail/sender';

// A process that sends mail and nothing else, for tests that kill it.
startMailSender();
