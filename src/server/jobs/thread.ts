// The levelling thread's entry: built beside the worker's, so that the worker finds it by name.
import '@/solver/levelling.thread';
