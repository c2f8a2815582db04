export { PacketInput } from './packetInput';
export { type PacketView, listPackets, type PrintedPacket, printPacket } from './packets';
export { closePacketPool, type PacketWatch } from './packetPool';
