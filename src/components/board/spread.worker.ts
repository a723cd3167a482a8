import { buffersOf, createSpreadDesk, type SpreadAsk } from './spreadDesk';

const desk = createSpreadDesk();

/** The thread beside the page: the sampled weeks are kept and tried here, so that the hand's frames stay free. */
self.addEventListener('message', (event: MessageEvent<SpreadAsk>) => {
  const answer = desk(event.data);
  self.postMessage(answer, { transfer: buffersOf(answer) });
});
