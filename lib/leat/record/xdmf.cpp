#include <leat/record/xdmf.hpp>

namespace leat::record {

namespace {

std::string escaped(const std::string& text)
{
    std::string result;
    for (const char letter : text) {
        switch (letter) {
        case '&':
            result += "&amp;";
            break;
        case '<':
            result += "&lt;";
            break;
        case '>':
            result += "&gt;";
            break;
        default:
            result += letter;
        }
    }
    return result;
}

std::string data_item(const std::string& source, const std::string& dimensions)
{
    return "<DataItem Format=\"HDF\" NumberType=\"Float\" Precision=\"8\" Dimensions=\"" + dimensions + "\">" +
           escaped(source) + "</DataItem>";
}

} // namespace

std::string xdmf_text(const std::string& hdf5_file, std::array<int, 2> cells)
{
    // Dimensions name the slowest index first: across, then along.
    const std::string points = std::to_string(cells[1] + 1) + " " + std::to_string(cells[0] + 1);
    const std::string centres = std::to_string(cells[1]) + " " + std::to_string(cells[0]);
    // All three coordinates in one array: of three separate ones a common reader silently drops the points.
    return "<?xml version=\"1.0\" encoding=\"UTF-8\"?>\n"
           "<Xdmf Version=\"3.0\">\n"
           "  <Domain>\n"
           "    <Grid Name=\"passage\" GridType=\"Uniform\">\n"
           "      <Topology TopologyType=\"2DSMesh\" Dimensions=\"" +
           points +
           "\"/>\n"
           "      <Geometry GeometryType=\"XYZ\">\n        " +
           data_item(hdf5_file + ":/mesh/points", points + " 3") +
           "\n      </Geometry>\n"
           "      <Attribute Name=\"pressure\" AttributeType=\"Scalar\" Center=\"Cell\">\n        " +
           data_item(hdf5_file + ":/cells/pressure", centres) +
           "\n      </Attribute>\n"
           "      <Attribute Name=\"velocity\" AttributeType=\"Vector\" Center=\"Cell\">\n        " +
           data_item(hdf5_file + ":/cells/velocity", centres + " 3") +
           "\n      </Attribute>\n"
           "    </Grid>\n"
           "  </Domain>\n"
           "</Xdmf>\n";
}

} // namespace leat::record
