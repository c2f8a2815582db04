export { PacketInput } from './packetInput';
export { type PacketView, listPackets, previewPacket, type PrintedPacket, printPacket } from './packets';
export { type PreviewSheet } from './packetDrawing';
export { closePacketPool, type PacketWatch } from './packetPool';
